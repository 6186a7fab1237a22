import { existsSync, readdirSync, rmSync } from 'node:fs'
import { addresses, postgres, script } from './database.mjs'
import { without } from './env.mjs'
import { inRoot } from './paths.mjs'

const parent = inRoot('.data')

/** The data folder of this run: two runs at once do not meet. */
export const testDataDir = inRoot(parent, `test-${process.pid}`)

// A database named in the environment is another one, and drop would protect it.
const env = without(process.env, 'DATABASE_URL', 'DATABASE_OWNER_URL')

async function remove(folder) {
  if (existsSync(inRoot(folder, 'pg'))) await postgres(['drop', folder], { quiet: true, last: true, env })
  rmSync(folder, { recursive: true, force: true })
}

/** Removes the clusters of runs that were killed, their servers too. */
export async function dropAbandoned() {
  if (!existsSync(parent)) return
  const folders = readdirSync(parent).filter(name => /^test-\d+$/.test(name) && !existsSync(`/proc/${name.slice(5)}`))
  for (const name of folders) await remove(inRoot(parent, name))
}

/** Makes this run's cluster. One for measuring writes as safely as a real one. */
export async function makeCluster({ durable }) {
  await postgres(['start', testDataDir], { env: { ...env, ...(!durable && { JAMNUT_PG_THROWAWAY: '1' }) } })
}

/** A fresh, migrated database in it, with the demo shop if asked: its addresses, as environment. */
export async function makeDatabase(name, given, { demo = false } = {}) {
  await postgres(['database', name, testDataDir], { quiet: true, env })
  const urls = await addresses(testDataDir, name)
  await script('migrate', ['up'], { ...given, ...urls })
  if (demo) await script('seed', ['demo'], { ...given, ...urls })
  return urls
}

/** Ends the cluster and deletes all this run kept. */
export const dropCluster = () => remove(testDataDir)
