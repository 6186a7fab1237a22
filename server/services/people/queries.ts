import type { Me, UserQuery } from '#shared/schemas/auth'
import type { Role } from '#shared/types/roles'
import type { ReadContext } from '../../context'
import { User } from '../../db/models/user'
import { Conditions, type Page, page } from '../../db/page'
import { notFound } from '../../refusal'
import { PIN_TRIES } from './pin'

export interface UserRow {
  id: string
  name: string
  email: string
  role: Role
  active: boolean
  hasPin: boolean
  pinLocked: boolean
  createdAt: Date
  lastSeenAt: Date | null
}

const columns = `u.id, u.name, u.email, u.role, u.active, u.pin_verifier IS NOT NULL AS "hasPin",
  u.pin_failures >= ${PIN_TRIES} AS "pinLocked", u.created_at AS "createdAt",
  (SELECT max(s.seen_at) FROM sessions s WHERE s.shop_id = u.shop_id AND s.user_id = u.id) AS "lastSeenAt"`

/** People of the shop. */
export function listUsers(ctx: ReadContext, query: UserQuery): Promise<Page<UserRow>> {
  return page<UserRow>(query, {
    select: columns,
    from: 'users u',
    id: 'u.id',
    where: new Conditions().add('u.shop_id = ?', ctx.shop.id),
    keys: { name: { sql: 'u.name', type: 'text' }, role: { sql: 'u.role', type: 'text' }, email: { sql: 'u.email', type: 'text' } },
    defaultSort: 'name',
  })
}

/** Whoever asks, with what concerns only them. */
export async function readMe(ctx: ReadContext): Promise<Pick<Me['user'], 'hasPin' | 'mustChangePassphrase'>> {
  const user = await User.findOne({ where: { shopId: ctx.shop.id, id: ctx.actor.id } })
  if (!user) throw notFound('Your account')
  return { hasPin: user.pinVerifier !== null, mustChangePassphrase: user.mustChangePassphrase }
}
