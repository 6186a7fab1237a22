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

/** Rows of one INSERT: enough to be fast, few enough to stay small. */
const rowsAtOnce = 1000

type AppendContext = Pick<Context, 'tx' | 'actor' | 'shop' | 'now'>

/**
 * Appends to the shop's log; nothing else does. Locks the shop's row until the transaction ends, so that entries follow
 * one another without gaps: call it after every other lock, and before the inserts that need the number.
 * @throws Error when the shop is not there or the content has no JSON
 */
export async function appendToLog(ctx: AppendContext, entry: Entry): Promise<Appended> {
  const [appended] = await appendAllToLog(ctx, [entry])
  if (!appended) throw new Error('Nothing was appended.')
  return appended
}

/** Appends many entries in their order, with one lock and a few statements. @throws Error as appendToLog does */
export async function appendAllToLog(ctx: AppendContext, entries: readonly Entry[]): Promise<Appended[]> {
  const texts = entries.map(entry => canonicalJson(entry.content))
  // A key share, which every insert into a shop's table takes through its foreign key, does not stand against this lock.
  const shop = await Shop.findByPk(ctx.shop.id, {
    attributes: ['id', 'logSequence', 'logHash'], lock: ctx.tx.LOCK.NO_KEY_UPDATE, transaction: ctx.tx,
  })
  if (!shop) throw new Error('The shop whose log is to be written is not there.')
  let { logSequence: sequence, logHash: previousHash } = shop
  const rows = entries.map(({ kind, subject, content, actor = ctx.actor.id }, index) => {
    sequence += 1
    const record: LogRecord = {
      sequence, shopId: shop.id, kind, subject, actor, at: ctx.now.toISOString(), content, previousHash,
    }
    const hash = entryHash(record)
    previousHash = hash
    return { ...record, at: ctx.now, content: texts[index] ?? '', hash }
  })
  for (let start = 0; start < rows.length; start += rowsAtOnce) {
    await LogEntry.bulkCreate(rows.slice(start, start + rowsAtOnce), { transaction: ctx.tx })
  }
  await shop.update({ logSequence: sequence, logHash: previousHash }, { transaction: ctx.tx })
  return rows.map(row => ({ sequence: row.sequence, hash: row.hash, previousHash: row.previousHash }))
}
