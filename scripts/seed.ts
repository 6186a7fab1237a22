/** seed.ts if-empty | demo | minimal — the demo scenario, or a shop with its first administrator (JAMNUT_ADMIN_EMAIL). */
import { hasShop, seedDemo, seedMinimal } from '../seeds'
import { closeDatabase, openDatabase } from '../server/db'
import { closeCounters, openCounters } from '../server/db/counters'
import { databaseAddresses } from './addresses'

async function run(verb: string | undefined) {
  const full = await hasShop()
  if (verb === 'if-empty' && full) return
  if (verb !== 'if-empty' && full) throw new Error('There is a shop already: demo data belongs into an empty database.')
  if (verb === 'if-empty' || verb === 'demo') {
    await seedDemo(new Date())
    return
  }
  if (verb !== 'minimal') throw new Error('usage: seed.ts if-empty | demo | minimal')
  const email = process.env.JAMNUT_ADMIN_EMAIL?.trim().toLowerCase()
  if (!email?.includes('@')) throw new Error('JAMNUT_ADMIN_EMAIL must be the first administrator\'s e-mail address.')
  console.log(`administrator  ${email}`)
  console.log(`passphrase     ${await seedMinimal(email, new Date())}   (shown this once; change it after signing in)`)
}

try {
  const { web } = await databaseAddresses()
  openDatabase(web)
  openCounters(web)
  await run(process.argv[2])
} catch (error) {
  console.error(`Error: ${error instanceof Error ? error.message : String(error)}`)
  process.exitCode = 1
} finally {
  await closeCounters()
  await closeDatabase()
}
