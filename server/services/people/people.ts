import { uuidv7 } from '#shared/ids/uuid'
import type { CreateUserBody, ShopRules, UpdateUserBody } from '#shared/schemas/auth'
import type { Context } from '../../context'
import { Shop } from '../../db/models/shop'
import { User } from '../../db/models/user'
import { updateUser as mayUpdate } from '../../policies/people'
import { authorize } from '../../policies/policy'
import { notFound, refused } from '../../refusal'
import { appendToLog } from '../log/append'
import { hashPassphrase, temporaryPassphrase, verifyPassphrase } from './passphrase'
import { pinVerifier, refuseWeakPin } from './pin'
import { endSessionsOf } from './sessions'

/** Adds a person with a temporary passphrase, which is answered once and must be changed. */
export async function addUser(ctx: Context, input: CreateUserBody & { passphrase?: string, pin?: string }): Promise<{ user: User, temporaryPassphrase: string }> {
  const passphrase = input.passphrase ?? temporaryPassphrase()
  const id = uuidv7(ctx.now.getTime())
  const user = await User.create({
    id,
    shopId: ctx.shop.id,
    name: input.name,
    email: input.email,
    role: input.role,
    passphraseHash: await hashPassphrase(passphrase),
    mustChangePassphrase: input.passphrase === undefined,
    pinVerifier: input.pin === undefined ? null : pinVerifier(id, input.pin),
    createdAt: ctx.now,
  }, { transaction: ctx.tx })
  await appendToLog(ctx, { kind: 'users.create', subject: id, content: { name: input.name, email: input.email, role: input.role } })
  return { user, temporaryPassphrase: passphrase }
}

/** Changes a person's name, role or access; a new role, passphrase or a disabling ends all their sessions. */
export async function changeUser(ctx: Context, id: string, input: UpdateUserBody): Promise<{ user: User, temporaryPassphrase?: string }> {
  const user = await User.findOne({ where: { shopId: ctx.shop.id, id }, lock: ctx.tx.LOCK.UPDATE, transaction: ctx.tx })
  if (!user) throw notFound('This person')
  const onlyName = Object.keys(input).every(key => key === 'name')
  authorize(ctx.actor, mayUpdate, { id, changes: onlyName ? 'name' : 'access' })
  const before = { name: user.name, role: user.role, active: user.active }
  const passphrase = input.resetPassphrase ? temporaryPassphrase() : undefined
  await user.update({
    name: input.name ?? user.name,
    role: input.role ?? user.role,
    active: input.active ?? user.active,
    ...(input.unlockPin ? { pinVerifier: null, pinFailures: 0 } : {}),
    ...(passphrase ? { passphraseHash: await hashPassphrase(passphrase), mustChangePassphrase: true } : {}),
  }, { transaction: ctx.tx })
  const endsSessions = input.endSessions || passphrase || user.role !== before.role || (before.active && !user.active)
  if (endsSessions) await endSessionsOf(user, ctx.now, ctx.tx)
  await appendToLog(ctx, {
    kind: 'users.update',
    subject: id,
    content: {
      before, after: { name: user.name, role: user.role, active: user.active },
      sessionsEnded: Boolean(endsSessions), pinCleared: Boolean(input.unlockPin), passphraseReset: Boolean(passphrase),
    },
  })
  return passphrase ? { user, temporaryPassphrase: passphrase } : { user }
}

async function ownRow(ctx: Context, passphrase: string, path: string): Promise<User> {
  const user = await User.findOne({ where: { shopId: ctx.shop.id, id: ctx.actor.id }, lock: ctx.tx.LOCK.UPDATE, transaction: ctx.tx })
  if (!user) throw notFound('Your account')
  if (!await verifyPassphrase(user.passphraseHash, passphrase)) throw refused('wrong_passphrase', 'That is not your passphrase.', path)
  return user
}

/** Changes one's own passphrase; ends all other sessions. @throws Refusal 422 `wrong_passphrase`, `same_passphrase` */
export async function changePassphrase(ctx: Context, input: { current: string, next: string }): Promise<void> {
  const user = await ownRow(ctx, input.current, 'current')
  if (input.current === input.next) throw refused('same_passphrase', 'Choose another passphrase than the old one.', 'next')
  await user.update({ passphraseHash: await hashPassphrase(input.next), mustChangePassphrase: false }, { transaction: ctx.tx })
  await endSessionsOf(user, ctx.now, ctx.tx, ctx.actor.sessionId)
  await appendToLog(ctx, { kind: 'users.change_passphrase', subject: user.id, content: {} })
}

/** Sets one's own PIN, confirmed with the passphrase, and unlocks it. @throws Refusal 422 `wrong_passphrase`, `weak_pin` */
export async function changePin(ctx: Context, input: { password: string, pin: string }): Promise<void> {
  refuseWeakPin(input.pin)
  const user = await ownRow(ctx, input.password, 'password')
  await user.update({ pinVerifier: pinVerifier(user.id, input.pin), pinFailures: 0 }, { transaction: ctx.tx })
  await appendToLog(ctx, { kind: 'users.change_pin', subject: user.id, content: {} })
}

/** Changes the shop's own rules. */
export async function changeShopRules(ctx: Context, input: Partial<ShopRules>): Promise<ShopRules> {
  const after = { ...ctx.shop.rules, ...input }
  await Shop.update({ ...after }, { where: { id: ctx.shop.id }, transaction: ctx.tx })
  await appendToLog(ctx, { kind: 'shops.update', subject: ctx.shop.id, content: { before: ctx.shop.rules, after } })
  return after
}
