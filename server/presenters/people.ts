import type { Me, UserAnswer } from '#shared/schemas/auth'
import type { Actor, ReadContext } from '../context'
import type { User } from '../db/models/user'
import * as people from '../policies/people'
import { canDo, roleMay } from '../policies/policy'
import type { UserRow } from '../services/people/queries'
import { PIN_TRIES } from '../services/people/pin'

/** A person as the administrator sees them; nothing of their secrets leaves. */
export function presentUser(actor: Actor, user: UserRow): UserAnswer {
  return {
    id: user.id,
    name: user.name,
    email: user.email,
    role: user.role,
    active: user.active,
    hasPin: user.hasPin,
    pinLocked: user.pinLocked,
    createdAt: user.createdAt.toISOString(),
    lastSeenAt: user.lastSeenAt?.toISOString() ?? null,
    can: {
      ...canDo(actor, { id: user.id, changes: 'name' as const }, { rename: people.updateUser }),
      ...canDo(actor, { id: user.id, changes: 'access' as const }, { changeAccess: people.updateUser }),
    },
  }
}

/** The same from the model that a change returns. */
export const presentChangedUser = (actor: Actor, user: User): UserAnswer => presentUser(actor, {
  id: user.id,
  name: user.name,
  email: user.email,
  role: user.role,
  active: user.active,
  hasPin: user.pinVerifier !== null,
  pinLocked: user.pinFailures >= PIN_TRIES,
  createdAt: user.createdAt,
  lastSeenAt: null,
})

/** Whoever is signed in, with the shop and what their role may ever do: for the navigation. */
export function presentMe(ctx: ReadContext, own: Pick<Me['user'], 'hasPin' | 'mustChangePassphrase'>, policies: Record<string, { roles: readonly Actor['role'][] }>): Me {
  const { id, name, email, role, shopId } = ctx.actor
  return {
    user: { id, name, email, role, shopId, ...own },
    shop: { id: ctx.shop.id, name: ctx.shop.name, timeZone: ctx.shop.timeZone, rules: ctx.shop.rules },
    can: Object.fromEntries(Object.entries(policies).map(([key, policy]) => [key, roleMay(role, policy).allowed])),
  }
}
