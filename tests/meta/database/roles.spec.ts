import { QueryTypes } from 'sequelize'
import { beforeAll, describe, expect, it } from 'vitest'
import { appendOnlyTables } from '../../../server/db/append-only'
import { migrateUp } from '../../../server/db/migrate'
import { roleOf, useScratch } from '../../server/support/scratch'

describe('the web server\'s role', () => {
  const scratch = useScratch()
  const role = roleOf(scratch.webUrl)
  const select = <Row extends object>(sql: string) =>
    scratch.owner.query<Row>(sql, { type: QueryTypes.SELECT, replacements: { role } })

  const rightsByTable = async () => {
    const rows = await select<{ name: string, rights: string[] }>(`
      SELECT relname AS name, array_agg(privilege ORDER BY privilege) AS rights
      FROM pg_class CROSS JOIN
        unnest(ARRAY['SELECT', 'INSERT', 'UPDATE', 'DELETE', 'TRUNCATE', 'REFERENCES', 'TRIGGER']) AS privilege
      WHERE relnamespace = current_schema()::regnamespace AND relkind = 'r'
        AND has_table_privilege(:role, pg_class.oid, privilege)
      GROUP BY relname`)
    return Object.fromEntries(rows.map(row => [row.name, row.rights.join(' ')]))
  }

  it('owns nothing and is no member of a role that does', async () => {
    expect(await select('SELECT * FROM pg_shdepend WHERE refobjid = (:role)::regrole AND deptype = \'o\'')).toEqual([])
    expect(await select('SELECT * FROM pg_auth_members WHERE member = (:role)::regrole')).toEqual([])
    const abilities = 'rolsuper, rolcreaterole, rolcreatedb, rolbypassrls'
    expect(await select(`SELECT ${abilities} FROM pg_roles WHERE rolname = :role`))
      .toEqual([{ rolsuper: false, rolcreaterole: false, rolcreatedb: false, rolbypassrls: false }])
  })

  it.each([
    'CREATE TABLE mine (id int)', 'CREATE SCHEMA mine', 'CREATE TEMPORARY TABLE mine (id int)', 'CREATE DATABASE mine',
    'CREATE TABLE public.mine (id int)', 'ALTER TABLE log_entries DISABLE TRIGGER ALL', 'DROP TABLE log_entries',
    'CREATE FUNCTION mine() RETURNS int LANGUAGE sql AS \'SELECT 1\'', 'SET session_replication_role = replica',
    'INSERT INTO "SequelizeMeta" VALUES (\'mine\')', 'DELETE FROM users',
  ])('may not: %s', async (sql) => {
    await expect(scratch.web.query(sql)).rejects.toThrow(/permission denied|must be owner/)
  })

  it('reads and adds everywhere, changes only what is not signed, deletes only spent counters', async () => {
    const rights = await rightsByTable()
    expect(rights.SequelizeMeta).toBe('SELECT')
    expect(rights.sign_in_failures).toBe('DELETE INSERT SELECT UPDATE')
    for (const table of appendOnlyTables) expect(rights[table], table).toBe('INSERT SELECT')
    const special: readonly string[] = [...appendOnlyTables, 'SequelizeMeta', 'sign_in_failures']
    const others = Object.entries(rights).filter(([table]) => !special.includes(table))
    expect(others.map(([table]) => table)).toContain('shops')
    for (const [table, held] of others) expect(held, table).toBe('INSERT SELECT UPDATE')
  })

  describe('after a stray grant', () => {
    beforeAll(async () => {
      await scratch.owner.query(`GRANT ALL ON log_entries TO PUBLIC; GRANT ALL ON sign_offs TO ${role}`)
      await migrateUp(scratch.ownerUrl, role)
    })

    it('is set right by the next migration run', async () => {
      const rights = await rightsByTable()
      expect([rights.log_entries, rights.sign_offs]).toEqual(['INSERT SELECT', 'INSERT SELECT'])
    })
  })
})
