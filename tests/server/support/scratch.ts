import { randomBytes } from 'node:crypto'
import type { Sequelize } from 'sequelize'
import { afterAll, beforeAll } from 'vitest'
import { connect } from '../../../server/db/client'
import { migrateUp } from '../../../server/db/migrate'
import { databaseUrl } from './database'

/** The test database's address, as the role that owns its tables. */
export function ownerUrl(): string {
  const url = process.env.DATABASE_OWNER_URL
  if (!url) throw new Error('Run server tests by `npm run test:server`: it makes their database.')
  return url
}

/** The name of the role that an address signs in as. */
export const roleOf = (url: string) => decodeURIComponent(new URL(url).username)

function within(url: string, schema: string): string {
  const address = new URL(url)
  address.searchParams.set('options', `-c search_path=${schema}`)
  return address.href
}

/** A schema of its own for a file of tests that locks, changes or drops whole tables; the others notice nothing. */
export interface Scratch {
  schema: string
  ownerUrl: string
  webUrl: string
  owner: Sequelize
  web: Sequelize
}

/** Makes a scratch schema before the tests of a file, migrated unless told not to be, and drops it after them. */
export function useScratch({ migrated = true } = {}): Scratch {
  const schema = `scratch_${randomBytes(5).toString('hex')}`
  const urls = { ownerUrl: within(ownerUrl(), schema), webUrl: within(databaseUrl(), schema) }
  const scratch = {
    schema, ...urls, owner: connect(urls.ownerUrl, { max: 2 }), web: connect(urls.webUrl, { max: 2 }),
  }
  beforeAll(async () => {
    await scratch.owner.query(`CREATE SCHEMA ${schema}`)
    if (migrated) await migrateUp(urls.ownerUrl, roleOf(urls.webUrl))
  })
  afterAll(async () => {
    await scratch.web.close()
    await scratch.owner.query(`DROP SCHEMA ${schema} CASCADE`)
    await scratch.owner.close()
  })
  return scratch
}
