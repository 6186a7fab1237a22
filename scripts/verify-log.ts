/** Walks the log of every shop and recomputes it; exits with 1 when one is not as it was written. */
import { closeDatabase, openDatabase } from '../server/db/index'
import { Shop } from '../server/db/models/shop'
import { verifyLog, type LogCheck } from '../server/services/log/queries'
import { databaseAddresses } from './addresses'

const faults: Record<Exclude<LogCheck, { ok: true }>['why'], string> = {
  sequence: 'it is missing, or the order was changed',
  previous_hash: 'it does not follow from the entry before it',
  hash: 'something in it was changed',
  head: 'the shop remembers another end of its log',
}

const count = (entries: number) => entries === 1 ? '1 entry' : `${entries} entries`

async function run() {
  const { web } = await databaseAddresses()
  openDatabase(web, { max: 1 })
  const shops = await Shop.findAll({ order: [['createdAt', 'ASC'], ['id', 'ASC']] })
  if (shops.length === 0) console.log('no shop, no log')
  for (const shop of shops) {
    const check = await verifyLog(shop.id)
    if (check.ok) {
      console.log(`log of ${shop.name}: ${count(check.head.sequence)}, intact, head ${check.head.hash}`)
    } else {
      console.log(`log of ${shop.name}: broken at entry ${check.brokenAt}: ${faults[check.why]}`)
      process.exitCode = 1
    }
  }
}

try {
  await run()
} catch (error) {
  console.error(`Error: ${error instanceof Error ? error.message : String(error)}`)
  process.exitCode = 1
} finally {
  await closeDatabase()
}
