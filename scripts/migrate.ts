/** migrate.ts up (default) | down [N | all] | redo — as the owner, one runner at a time. */
import { migrateDown, migrateUp } from '../server/db/migrate'
import { databaseAddresses } from './addresses'

const say = (about: string, names: string[]) => {
  if (names.length === 0) console.log(`${about.padEnd(10)} nothing to do`)
  for (const name of names) console.log(`${about.padEnd(10)} ${name}`)
}

const user = (url: string) => decodeURIComponent(new URL(url).username)

async function run([verb = 'up', count = '1']: string[]) {
  const { web, owner } = await databaseAddresses()
  const webRole = user(web) === user(owner) ? null : user(web)
  if (verb === 'up') return say('up', await migrateUp(owner, webRole))
  if (verb === 'down' && /^([1-9]\d*|all)$/.test(count)) {
    return say('down', await migrateDown(owner, count === 'all' ? 'all' : Number(count)))
  }
  if (verb === 'redo') {
    say('down', await migrateDown(owner, 1))
    return say('up', await migrateUp(owner, webRole))
  }
  throw new Error('usage: migrate.ts up | down [N | all] | redo')
}

try {
  await run(process.argv.slice(2))
} catch (error) {
  console.error(`Error: ${error instanceof Error ? error.message : String(error)}`)
  process.exitCode = 1
}
