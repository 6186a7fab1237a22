import { afterAll, beforeAll } from 'vitest'
import { closeDatabase, openDatabase } from '../../../server/db'
import { closeCounters, openCounters } from '../../../server/db/counters'

/** The test database's address, as the web server's role. */
export function databaseUrl(): string {
  const url = process.env.DATABASE_URL
  if (!url) throw new Error('Run server tests by `npm run test:server`: it makes their database.')
  return url
}

/** Opens the database for a file of tests, as the web server's role, and closes it after. */
export function useDatabase(): void {
  beforeAll(() => {
    // Each caller of the tests comes from an address of its own.
    process.env.JAMNUT_TRUST_PROXY = '1'
    process.env.JAMNUT_PIN_PEPPER ??= 'a pepper only for tests, thirty-two or more'
    process.env.NUXT_SESSION_PASSWORD ??= 'a session password only for tests, long enough'
    openDatabase(databaseUrl())
    openCounters(databaseUrl())
  })
  afterAll(async () => {
    await closeCounters()
    await closeDatabase()
  })
}
