import { Op, Transaction } from 'sequelize'
import type { ReadContext } from '../../context'
import { database } from '../../db/index'
import { LogEntry } from '../../db/models/log-entry'
import { Shop } from '../../db/models/shop'
import { readCanonical, verifyChain, type ChainFault, type HashedRecord, type LogHead } from './hash'

type Ctx = Pick<ReadContext, 'shop' | 'tx'>

/** An entry with the value of its content and its time as text: what was hashed. */
export function hashedRecord(entry: LogEntry): HashedRecord {
  const { sequence, shopId, kind, subject, actor, at, content, previousHash, hash } = entry
  return {
    sequence, shopId, kind, subject, actor, at: at.toISOString(), content: readCanonical(content), previousHash, hash,
  }
}

/** The entries after number `after`, oldest first; `next` is the `after` of the following page, null at the end. */
export async function listLog(
  { shop, tx }: Ctx,
  { after, limit }: { after: number, limit: number },
): Promise<{ items: HashedRecord[], next: number | null }> {
  const found = await LogEntry.findAll({
    where: { shopId: shop.id, sequence: { [Op.gt]: after } },
    order: [['sequence', 'ASC']],
    limit: limit + 1,
    transaction: tx,
  })
  const items = found.slice(0, limit).map(hashedRecord)
  return { items, next: found.length > limit ? items.at(-1)?.sequence ?? null : null }
}

/** Where the shop's log stands; `at` is the time of its last entry. */
export async function logHead({ shop, tx }: Ctx): Promise<LogHead & { at: Date | null }> {
  const row = await Shop.findByPk(shop.id, { rejectOnEmpty: true, transaction: tx })
  const last = await LogEntry.findOne({
    attributes: ['at'], where: { shopId: shop.id, sequence: row.logSequence }, transaction: tx,
  })
  return { sequence: row.logSequence, hash: row.logHash, at: last?.at ?? null }
}

const pageSize = 1000

async function* everyEntry(shopId: string, transaction: Transaction): AsyncGenerator<HashedRecord> {
  let after = 0
  for (;;) {
    const page = await LogEntry.findAll({
      where: { shopId, sequence: { [Op.gt]: after } }, order: [['sequence', 'ASC']], limit: pageSize, transaction,
    })
    for (const entry of page) yield hashedRecord(entry)
    const last = page.at(-1)
    if (!last || page.length < pageSize) return
    after = last.sequence
  }
}

export type LogCheck
  = | { ok: true, head: LogHead }
    /** `head`: the shop's row remembers another last entry than the log has. */
    | { ok: false, brokenAt: number, why: ChainFault | 'head' }

/** Walks a shop's whole log as it is at this moment, a page at a time, and compares its end with the shop's row. */
export function verifyLog(shopId: string): Promise<LogCheck> {
  const snapshot = { isolationLevel: Transaction.ISOLATION_LEVELS.REPEATABLE_READ, readOnly: true }
  return database().transaction(snapshot, async (transaction) => {
    const { logSequence, logHash } = await Shop.findByPk(shopId, { rejectOnEmpty: true, transaction })
    const check = await verifyChain(everyEntry(shopId, transaction))
    if (!check.ok || (check.head.sequence === logSequence && check.head.hash === logHash)) return check
    // Entries missing at the end: the first of them; entries the shop's row knows nothing of: the first of those.
    return { ok: false, brokenAt: Math.min(check.head.sequence, logSequence) + 1, why: 'head' }
  })
}
