import { QueryTypes, type Sequelize } from 'sequelize'
import { migrations } from './migrations/index'

/** Names of the migrations that the database has had, oldest first; none where it was never migrated. */
export async function appliedMigrations(sequelize: Sequelize): Promise<string[]> {
  const [meta] = await sequelize.query<{ there: boolean }>(
    `SELECT to_regclass('"SequelizeMeta"') IS NOT NULL AS there`, { type: QueryTypes.SELECT },
  )
  if (!meta?.there) return []
  const rows = await sequelize.query<{ name: string }>(
    'SELECT name FROM "SequelizeMeta" ORDER BY name', { type: QueryTypes.SELECT },
  )
  return rows.map(row => row.name)
}

/** Names of the migrations that the program knows and the database has not had, oldest first. */
export async function pendingMigrations(sequelize: Sequelize): Promise<string[]> {
  const applied = new Set(await appliedMigrations(sequelize))
  return migrations.map(migration => migration.name).filter(name => !applied.has(name))
}
