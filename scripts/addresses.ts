import { addresses } from './lib/database.mjs'
import { dataDir } from './lib/paths.mjs'

/** The database that the environment names, else the one in the data folder: its addresses for server and owner. */
export async function databaseAddresses(): Promise<{ web: string, owner: string }> {
  const { DATABASE_URL, DATABASE_OWNER_URL } = process.env
  if (DATABASE_URL) return { web: DATABASE_URL, owner: DATABASE_OWNER_URL || DATABASE_URL }
  const { DATABASE_URL: web = '', DATABASE_OWNER_URL: owner = '' } = await addresses(dataDir)
  return { web, owner }
}
