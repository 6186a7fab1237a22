import * as z from 'zod/mini'
import { roles } from '../types/roles'
import { can, listOf, moment, pageQuery, pin, text, uuid } from './common'

/** Passphrases: 15 characters or more (NIST SP 800-63B-4), any characters, no forced change. */
export const passphrase = z.string().check(z.minLength(15), z.maxLength(200))
export const email = z.string().check(z.trim(), z.toLowerCase(), z.maxLength(200), z.email())

export const signInBody = z.strictObject({
  email: z.string().check(z.trim(), z.toLowerCase(), z.minLength(1), z.maxLength(200)),
  password: z.string().check(z.minLength(1), z.maxLength(500)),
})
export const signedInUser = z.strictObject({ id: uuid, name: z.string(), role: z.enum(roles), shopId: uuid })
export const signInAnswer = z.strictObject({ user: signedInUser })

/** The shop's own rules; an administrator changes them. */
export const shopRules = z.strictObject({
  defaultTolerancePercent: z.number().check(z.gt(0), z.lt(100)),
  dueSoonDays: z.int().check(z.gte(0), z.lte(365)),
  unfitWrench: z.enum(['refuse', 'exception']),
  approveOwnDraft: z.boolean(),
  releaseOwnJoint: z.boolean(),
})
export const meAnswer = z.strictObject({
  user: z.strictObject({ ...signedInUser.shape, email: z.string(), hasPin: z.boolean(), mustChangePassphrase: z.boolean() }),
  shop: z.strictObject({ id: uuid, name: z.string(), timeZone: z.string(), rules: shopRules }),
  can,
})
export const changePassphraseBody = z.strictObject({ current: z.string().check(z.minLength(1), z.maxLength(500)), next: passphrase })
export const changePinBody = z.strictObject({ password: z.string().check(z.minLength(1), z.maxLength(500)), pin })
export const doneAnswer = z.strictObject({ done: z.literal(true) })

export const userSorts = ['name', 'role', 'email'] as const
export const userQuery = z.strictObject({ ...pageQuery(userSorts) })
export const userAnswer = z.strictObject({
  id: uuid,
  name: z.string(),
  email: z.string(),
  role: z.enum(roles),
  active: z.boolean(),
  hasPin: z.boolean(),
  pinLocked: z.boolean(),
  createdAt: moment,
  lastSeenAt: z.nullable(moment),
  can,
})
export const userListAnswer = listOf(userAnswer)
export const createUserBody = z.strictObject({ name: text(100), email, role: z.enum(roles) })
/** The first temporary passphrase is answered once and never again. */
export const createdUserAnswer = z.strictObject({ ...userAnswer.shape, temporaryPassphrase: z.string() })
export const updateUserBody = z.strictObject({
  name: z.optional(text(100)),
  role: z.optional(z.enum(roles)),
  active: z.optional(z.boolean()),
  endSessions: z.optional(z.literal(true)),
  unlockPin: z.optional(z.literal(true)),
  resetPassphrase: z.optional(z.literal(true)),
})
export const updatedUserAnswer = z.strictObject({ ...userAnswer.shape, temporaryPassphrase: z.optional(z.string()) })
export const shopRulesBody = z.partial(shopRules)
export const shopAnswer = z.strictObject({ id: uuid, name: z.string(), timeZone: z.string(), rules: shopRules })

export type SignInBody = z.infer<typeof signInBody>
export type SignedInUser = z.infer<typeof signedInUser>
export type Me = z.infer<typeof meAnswer>
export type ShopRules = z.infer<typeof shopRules>
export type UserAnswer = z.infer<typeof userAnswer>
export type CreateUserBody = z.infer<typeof createUserBody>
export type UpdateUserBody = z.infer<typeof updateUserBody>
export type UserQuery = z.infer<typeof userQuery>
