import { existsSync, readdirSync, rmSync } from 'node:fs'
import { addresses, postgres, script } from './database.mjs'
import { inRoot } from './paths.mjs'

const parent = inRoot('.data')

/** The data folder of this run: two runs at once do not meet. */
export const testDataDir = inRoot(parent, `test-${process.pid}`)

async function remove(folder) {
  if (existsSync(inRoot(folder, 'pg'))) await postgres(['drop', folder], { quiet: true, last: true, env: withoutDatabase() })
  rmSync(folder, { recursive: true, force: true })
}

// drop protects a database that the environment names; ours is another.
function withoutDatabase(env = process.env) {
  const { DATABASE_URL: _url, DATABASE_OWNER_URL: _owner, ...rest } = env
  return rest
}

/** Removes the clusters of runs that were killed, their servers too. */
export async function dropAbandoned() {
  if (!existsSync(parent)) return
  const folders = readdirSync(parent).filter(name => /^test-\d+$/.test(name) && !existsSync(`/proc/${name.slice(5)}`))
  for (const name of folders) await remove(inRoot(parent, name))
}

/** Makes this run's cluster. One for measuring writes as safely as a real one. */
export async function makeCluster({ durable }) {
  await postgres(['start', testDataDir], { env: { ...withoutDatabase(), ...(!durable && { JAMNUT_PG_THROWAWAY: '1' }) } })
}

/** A fresh, migrated database in it, with the demo shop if asked: its addresses, as environment. */
export async function makeDatabase(name, env, { demo = false } = {}) {
  await postgres(['database', name, testDataDir], { quiet: true, env: withoutDatabase() })
  const urls = await addresses(testDataDir, name)
  await script('migrate', ['up'], { ...env, ...urls })
  if (demo) await script('seed', ['demo'], { ...env, ...urls })
  return urls
}

/** Ends the cluster and deletes all this run kept. */
export const dropCluster = () => remove(testDataDir)
