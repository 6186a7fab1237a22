import pg from 'pg'
import type { Sequelize } from 'sequelize'
import { Umzug, type UmzugStorage } from 'umzug'
import { connect } from './client'
import { grantWebRole } from './grants'
import { migrations } from './migrations/index'
import type { Migration } from './migrations/types'
import { appliedMigrations } from './pending'

/** Any number, as long as it is always this one: two runners at once take turns. */
const lockKey = 5_200_163

const remember = {
  up: 'INSERT INTO "SequelizeMeta" (name) VALUES (:name)',
  down: 'DELETE FROM "SequelizeMeta" WHERE name = :name',
}

/** One step and the note that it was taken, in one transaction: both are there or neither. */
async function take(sequelize: Sequelize, migration: Migration, way: 'up' | 'down') {
  await sequelize.transaction(async (transaction) => {
    await migration[way]({ query: sequelize.getQueryInterface(), transaction })
    await sequelize.query(remember[way], { transaction, replacements: { name: migration.name } })
  })
}

// The steps take the notes themselves.
const storage: UmzugStorage<Sequelize> = {
  executed: ({ context }) => appliedMigrations(context),
  logMigration: () => Promise.resolve(),
  unlogMigration: () => Promise.resolve(),
}

const runner = (sequelize: Sequelize) => new Umzug<Sequelize>({
  migrations: migrations.map(migration => ({
    name: migration.name,
    up: () => take(sequelize, migration, 'up'),
    down: () => take(sequelize, migration, 'down'),
  })),
  context: sequelize,
  storage,
  logger: undefined,
})

/** Runs `work` while no other runner does. The lock has a connection of its own, and ends with it. */
async function alone<Result>(ownerUrl: string, work: (sequelize: Sequelize) => Promise<Result>): Promise<Result> {
  const keeper = new pg.Client({ connectionString: ownerUrl })
  await keeper.connect()
  const sequelize = connect(ownerUrl, { max: 1 })
  try {
    await keeper.query('SELECT pg_advisory_lock($1)', [lockKey])
    await sequelize.query('CREATE TABLE IF NOT EXISTS "SequelizeMeta" (name varchar(255) PRIMARY KEY)')
    return await work(sequelize)
  } finally {
    await sequelize.close()
    await keeper.end()
  }
}

const names = (steps: { name: string }[]) => steps.map(step => step.name)

/**
 * Brings the database up to date, then sets the rights of the web server's role.
 * @param webRole its name; null where owner and server are one role
 * @returns the names of the migrations applied
 */
export function migrateUp(ownerUrl: string, webRole: string | null): Promise<string[]> {
  return alone(ownerUrl, async (sequelize) => {
    const applied = await runner(sequelize).up()
    if (webRole !== null) await grantWebRole(sequelize, webRole)
    return names(applied)
  })
}

/** Takes back the newest `count` migrations, data and all. @returns their names, newest first */
export function migrateDown(ownerUrl: string, count: number | 'all'): Promise<string[]> {
  return alone(ownerUrl, async (sequelize) => {
    const undone = await runner(sequelize).down(count === 'all' ? { to: 0 } : { step: count })
    return names(undone)
  })
}
