import { QueryTypes, type Sequelize } from 'sequelize'
import { appendOnlyTables } from './append-only'

const appendOnly: readonly string[] = appendOnlyTables

function privilegesOn(table: string): string {
  if (table === 'SequelizeMeta') return 'SELECT'
  if (appendOnly.includes(table)) return 'SELECT, INSERT'
  // Counters that have run out are swept away.
  if (table === 'sign_in_failures') return 'SELECT, INSERT, UPDATE, DELETE'
  return 'SELECT, INSERT, UPDATE'
}

/**
 * Gives the web server's role what it needs and takes away all else, from it and from everybody. Run by the owner,
 * after every migration.
 */
export async function grantWebRole(sequelize: Sequelize, webRole: string): Promise<void> {
  const [place] = await sequelize.query<{ database: string, schema: string }>(
    'SELECT current_database() AS database, current_schema() AS schema', { type: QueryTypes.SELECT },
  )
  if (!place) throw new Error('The database does not say which it is.')
  const tables = await sequelize.query<{ name: string }>(
    'SELECT tablename AS name FROM pg_tables WHERE schemaname = :schema ORDER BY 1',
    { type: QueryTypes.SELECT, replacements: { schema: place.schema } },
  )
  const quote = (name: string) => `"${name.replaceAll('"', '""')}"`
  const role = quote(webRole)
  const schema = quote(place.schema)
  const everybody = `PUBLIC, ${role}`
  const kinds = ['TABLES', 'SEQUENCES', 'ROUTINES']
  const statements = [
    `REVOKE ALL ON DATABASE ${quote(place.database)} FROM ${everybody}`,
    `GRANT CONNECT ON DATABASE ${quote(place.database)} TO ${role}`,
    `REVOKE ALL ON SCHEMA ${schema} FROM ${everybody}`,
    `GRANT USAGE ON SCHEMA ${schema} TO ${role}`,
    ...kinds.map(kind => `REVOKE ALL ON ALL ${kind} IN SCHEMA ${schema} FROM ${everybody}`),
    ...tables.map(({ name }) => `GRANT ${privilegesOn(name)} ON ${schema}.${quote(name)} TO ${role}`),
  ]
  // In one transaction, so that a server that runs meanwhile is never without its rights.
  await sequelize.transaction(async transaction => void await sequelize.query(statements.join('; '), { transaction }))
}
