import * as z from 'zod/mini'
import { moment, uuid } from './common'

export const logQuery = z.strictObject({
  after: z._default(z.coerce.number().check(z.int(), z.gte(0)), 0),
  limit: z._default(z.coerce.number().check(z.int(), z.gte(1), z.lte(200)), 100),
})
export const logEntryAnswer = z.strictObject({
  sequence: z.int(),
  shopId: uuid,
  kind: z.string(),
  subject: uuid,
  actor: z.nullable(uuid),
  at: moment,
  content: z.unknown(),
  previousHash: z.string(),
  hash: z.string(),
})
/** `next` is the number to ask `after` for the following page; null at the end. */
export const logAnswer = z.strictObject({ items: z.array(logEntryAnswer), next: z.nullable(z.int()) })
export const logHeadAnswer = z.strictObject({ sequence: z.int(), hash: z.string(), at: z.nullable(moment) })
export const healthAnswer = z.strictObject({ status: z.literal('ok') })
export type LogQuery = z.infer<typeof logQuery>
