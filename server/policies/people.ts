import { everyone, no, policy, yes } from './policy'

const administrator = ['administrator'] as const

export const listUsers = policy('users.list', administrator)
export const createUser = policy('users.create', administrator)
/** Nobody locks himself out: an administrator may not change his own role or disable himself. */
export const updateUser = policy<{ id: string, changes: 'name' | 'access' }>('users.update', administrator, (actor, user) =>
  user.id === actor.id && user.changes === 'access' ? no('same_person', 'Somebody else has to change your own access.') : yes)
export const changeOwnSecrets = policy('users.change_own_secrets', everyone)
export const readOwn = policy('users.read_own', everyone)
export const changeShopRules = policy('shops.update', administrator)
