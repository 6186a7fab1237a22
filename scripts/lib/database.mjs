import { readdirSync } from 'node:fs'
import { refuseFullDisk } from './disk.mjs'
import { inRoot } from './paths.mjs'
import { lastLine, run, runNode } from './run.mjs'
import { Stop } from './say.mjs'

/** Runs docker-free-pg.sh and answers what it said; where it could not, its last line is the reason. */
export async function postgres(args, options) {
  const { code, output } = await run(inRoot('docker-free-pg.sh'), args, options)
  if (code !== 0) throw new Stop('database', lastLine(output).replace(/^database +/, ''))
  return output.trim()
}

/** The addresses of a database in a cluster of ours: { DATABASE_URL, DATABASE_OWNER_URL }. */
export async function addresses(dataDir, name = 'jamnut') {
  const urls = await Promise.all(['web', 'owner'].map(role => postgres(['url', role, dataDir], { quiet: true })))
  const [DATABASE_URL, DATABASE_OWNER_URL] = urls.map(url => Object.assign(new URL(url), { pathname: `/${name}` }).href)
  return { DATABASE_URL, DATABASE_OWNER_URL }
}

/** The names of our migrations, oldest first. */
export function migrationNames(folder = inRoot('server/db/migrations')) {
  return readdirSync(folder).filter(name => /^\d.*\.ts$/.test(name)).map(name => name.slice(0, -3)).sort()
}

/** What the database holds: { applied: names of migrations, shops: any at all, demo: the demo people }. */
export async function inspect(ownerUrl) {
  const { default: pg } = await import('pg')
  const client = new pg.Client({ connectionString: ownerUrl, connectionTimeoutMillis: 10_000 })
  const rows = async (table, query) => {
    const { rows: [{ found }] } = await client.query('select to_regclass($1) as found', [table])
    return found ? (await client.query(query)).rows : []
  }
  try {
    await client.connect()
    const applied = await rows('"SequelizeMeta"', 'select name from "SequelizeMeta" order by name')
    const shops = await rows('shops', 'select 1 from shops limit 1')
    const demo = await rows('users', `select 1 from users where email = 'technician@jamnut.example'`)
    return { applied: applied.map(row => row.name.replace(/\.ts$/, '')), shops: shops.length > 0, demo: demo.length > 0 }
  } catch (error) {
    throw new Stop('database', `The database does not answer as it should: ${error.message || error.code}`)
  } finally {
    await client.end().catch(() => {})
  }
}

/** How the database's migrations stand to ours: 'current', 'behind', or 'ahead' where it knows one that we do not. */
export function compareMigrations(ours, applied) {
  if (applied.some(name => !ours.includes(name))) return 'ahead'
  return ours.every(name => applied.includes(name)) ? 'current' : 'behind'
}

/** Runs one of the TypeScript scripts, such as 'migrate', to its end; shows nothing but what `shown` asks for. */
export async function script(name, args, env, { shown = false } = {}) {
  const file = inRoot('scripts', `${name}.ts`)
  const { code, output } = await runNode(['--import', 'jiti/register', file, ...args], { env: { ...process.env, ...env }, quiet: !shown })
  if (code !== 0) refuseFullDisk(name, output)
  if (code !== 0) throw new Stop(name, `${name} ${args.join(' ')} failed: ${failure(output)}`)
}

/** The line of a script's output that names its error. */
export function failure(output) {
  const lines = output.split('\n').map(line => line.trim()).filter(Boolean)
  return lines.find(line => /^(\w*Error|ERROR|error)\b/.test(line)) ?? lines.at(-1) ?? 'it said nothing'
}
