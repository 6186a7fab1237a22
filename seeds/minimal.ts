import { appendToLog } from '../server/services/log/append'
import { addUser } from '../server/services/people/people'
import { inTransaction } from '../server/transaction'
import { createShop, founder } from './shop'

/** A shop with its first administrator. @returns the temporary passphrase, which is shown once */
export async function seedMinimal(email: string, now: Date): Promise<string> {
  const shop = await createShop('Our shop', 'UTC', now)
  const { temporaryPassphrase } = await inTransaction({ actor: founder(shop, shop.id), shop, now }, async (ctx) => {
    await appendToLog(ctx, { kind: 'shops.create', subject: shop.id, actor: null, content: { name: shop.name } })
    return addUser({ ...ctx, actor: founder(shop, shop.id) }, { name: 'Administrator', email, role: 'administrator' })
  })
  return temporaryPassphrase
}
