import { ensureBuild } from './build.mjs'
import { addresses, compareMigrations, inspect, migrationNames, postgres, script } from './database.mjs'
import { requireSpace } from './disk.mjs'
import { without } from './env.mjs'
import { ensurePackages } from './install.mjs'
import { bin, dataDir } from './paths.mjs'
import { address, isLoopback, requireFree } from './port.mjs'
import { ended } from './run.mjs'
import { say, Stop } from './say.mjs'
import { openSecrets } from './secrets.mjs'
import { serve } from './server.mjs'

let served = false
let ownCluster = false

async function openDatabase() {
  const { DATABASE_URL, DATABASE_OWNER_URL } = process.env
  if (DATABASE_OWNER_URL && !DATABASE_URL) throw new Stop('database', 'DATABASE_OWNER_URL needs DATABASE_URL beside it.')
  if (DATABASE_URL) {
    say('database', DATABASE_OWNER_URL ? 'as DATABASE_URL says' : 'as DATABASE_URL says; without DATABASE_OWNER_URL the roles are not separated')
    return { DATABASE_URL, DATABASE_OWNER_URL: DATABASE_OWNER_URL ?? DATABASE_URL }
  }
  await postgres(['start', dataDir])
  ownCluster = true
  return addresses(dataDir)
}

async function migrate(env, applied) {
  const ours = migrationNames()
  const state = compareMigrations(ours, applied)
  if (state === 'current') return
  if (state === 'ahead') throw new Stop('migrate', 'The database is of a newer Jamnut than this one: update the program first.')
  const missing = ours.length - applied.length
  say('migrate', `applying ${missing} migration${missing === 1 ? '' : 's'}`)
  await script('migrate', ['up'], env)
}

/**
 * What an empty database is filled with: 'demo', 'minimal' (one administrator), or nothing.
 * @param {Record<string, string | undefined>} env
 */
export function firstData(env) {
  if (env.JAMNUT_DEMO !== '0') return 'demo'
  return env.JAMNUT_ADMIN_EMAIL ? 'minimal' : undefined
}

async function fill(env) {
  const data = firstData(process.env)
  if (data === 'demo') {
    say('demo', 'the database is empty, adding the demo shop (JAMNUT_DEMO=0 leaves it out)')
    await script('seed', ['if-empty'], env)
  } else if (data === 'minimal') {
    say('people', `adding the first administrator, ${process.env.JAMNUT_ADMIN_EMAIL}`)
    await script('seed', ['minimal'], env, { shown: true })
  } else {
    say('people', 'nobody can sign in yet: JAMNUT_DEMO=0 JAMNUT_ADMIN_EMAIL=you@example.com npm start adds the first one')
  }
}

function greet(url, demo) {
  console.log(`\nOpen ${url}`)
  if (demo) {
    console.log('and sign in as  technician@jamnut.example   (or technician2@, foreman@, quality@, advisor@, admin@)')
    console.log('passphrase      jamnut-demo-garage          PIN 408152')
  }
  console.log('Ctrl-C stops it.\n')
}

function warnOfHttp(host) {
  if (isLoopback(host) || process.env.NITRO_SSL_CERT) return
  say('server', `on ${host} without HTTPS: tablets need it to sign offline; set NITRO_SSL_CERT and NITRO_SSL_KEY, or use a proxy`)
}

/** Sets up what is missing and serves until the server ends: the exit code. */
export async function start({ dev }) {
  const here = address(process.env)
  await requireFree(here)
  requireSpace(dataDir, 100)
  await ensurePackages()
  const urls = await openDatabase()
  const secrets = openSecrets(dataDir)
  if (secrets.made.length) say('secrets', `made ${secrets.made.join(' and ')} in ${dataDir}/secrets`)
  if (!dev) await ensureBuild()

  const env = { ...urls, ...secrets.env, JAMNUT_DATA_DIR: dataDir }
  let state = await inspect(urls.DATABASE_OWNER_URL)
  await migrate(env, state.applied)
  if (!state.shops) {
    await fill(env)
    state = await inspect(urls.DATABASE_OWNER_URL)
  }

  warnOfHttp(here.host)
  await requireFree(here)
  say('server', dev ? 'starting for development' : 'starting')
  // The server never sees the owner's address: what it cannot do, nobody can make it do.
  const webEnv = without({ ...process.env, ...env, NODE_ENV: dev ? 'development' : 'production' }, 'DATABASE_OWNER_URL')
  const { child, url } = await serve({
    ...here,
    env: webEnv,
    ...(dev && { args: [bin('nuxt'), 'dev', '--host', here.host, '--port', String(here.port)], seconds: 180 }),
  })
  served = true
  greet(url, state.demo)
  const code = await ended(child)
  throw new Stop('server', `The server ended by itself, with code ${code}.`)
}

/** The last words after Ctrl-C or a signal. Stopping a server that served is a good end. */
export function stopped(code) {
  say('server', 'stopped')
  if (ownCluster) say('database', `keeps running: './docker-free-pg.sh stop' stops it`)
  return served ? 0 : code
}
