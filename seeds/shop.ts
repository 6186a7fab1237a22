import { uuidv7 } from '#shared/ids/uuid'
import type { Actor, Shop } from '../server/context'
import { database } from '../server/db'
import { Shop as ShopRow } from '../server/db/models/shop'

/** Makes a shop: the one row that no service makes, since nobody of the shop is there yet. */
export async function createShop(name: string, timeZone: string, createdAt: Date): Promise<Shop> {
  const row = await ShopRow.create({ id: uuidv7(createdAt.getTime()), name, timeZone, createdAt })
  await row.reload()
  const { defaultTolerancePercent, dueSoonDays, unfitWrench, approveOwnDraft, releaseOwnJoint } = row
  return { id: row.id, name, timeZone, rules: { defaultTolerancePercent, dueSoonDays, unfitWrench, approveOwnDraft, releaseOwnJoint } }
}

/** Whether the database holds any shop. */
export async function hasShop(): Promise<boolean> {
  const [rows] = await database().query('SELECT 1 FROM shops LIMIT 1')
  return rows.length > 0
}

/** Who makes the first person: nobody yet, so the log's actor is that person. */
export const founder = (shop: Shop, id: string): Actor => ({ id, name: 'First start', email: '', role: 'administrator', shopId: shop.id, sessionId: null })
