import type { Context } from '../../context'
import { LogEntry } from '../../db/models/log-entry'
import { Shop } from '../../db/models/shop'
import { canonicalJson, entryHash, type LogRecord } from './hash'

/** What a service has to say for the log. */
export interface Entry {
  /** `<resource>.<verb>` */
  kind: string
  /** Id of the record it is about. */
  subject: string
  /** The JSON value of what was recorded. */
  content: unknown
  /** Who did it, where that is not the person who asks; null where the product did it itself. */
  actor?: string | null
}

/** The place an entry got. */
export interface Appended {
  sequence: number
  hash: string
  previousHash: string
}

/**
 * Appends to the shop's log; nothing else does. Locks the shop's row until the transaction ends, so that entries follow
 * one another without gaps: call it after every other lock, and before the inserts that need the number.
 * @throws Error when the shop is not there or the content has no JSON
 */
export async function appendToLog(
  ctx: Pick<Context, 'tx' | 'actor' | 'shop' | 'now'>,
  { kind, subject, content, actor = ctx.actor.id }: Entry,
): Promise<Appended> {
  const text = canonicalJson(content)
  const shop = await Shop.findByPk(ctx.shop.id, {
    attributes: ['id', 'logSequence', 'logHash'], lock: ctx.tx.LOCK.UPDATE, transaction: ctx.tx,
  })
  if (!shop) throw new Error('The shop whose log is to be written is not there.')
  const sequence = shop.logSequence + 1
  const previousHash = shop.logHash
  const record: LogRecord = {
    sequence, shopId: shop.id, kind, subject, actor, at: ctx.now.toISOString(), content, previousHash,
  }
  const hash = entryHash(record)
  await LogEntry.create({ ...record, at: ctx.now, content: text, hash }, { transaction: ctx.tx })
  await shop.update({ logSequence: sequence, logHash: hash }, { transaction: ctx.tx })
  return { sequence, hash, previousHash }
}
