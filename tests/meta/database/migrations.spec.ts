import { QueryTypes, type Sequelize } from 'sequelize'
import { describe, expect, it } from 'vitest'
import { migrateDown, migrateUp } from '../../../server/db/migrate'
import { migrations } from '../../../server/db/migrations/index'
import { pendingMigrations } from '../../../server/db/pending'
import { roleOf, useScratch } from '../../server/support/scratch'

const names = migrations.map(migration => migration.name)

// The name of the schema is in some definitions; it is the same one all along.
const everything = `
  SELECT 'column' AS kind, table_name || '.' || column_name AS name,
    concat_ws(' ', data_type, character_maximum_length, is_nullable, column_default) AS definition
    FROM information_schema.columns WHERE table_schema = current_schema()
  UNION ALL
  SELECT 'constraint', conrelid::regclass || '.' || conname, pg_get_constraintdef(oid)
    FROM pg_constraint WHERE connamespace = current_schema()::regnamespace
  UNION ALL
  SELECT 'index', indexname, indexdef FROM pg_indexes WHERE schemaname = current_schema()
  UNION ALL
  SELECT 'trigger', tgrelid::regclass || '.' || tgname, concat_ws(' ', tgenabled, pg_get_triggerdef(t.oid))
    FROM pg_trigger t JOIN pg_class c ON c.oid = tgrelid
    WHERE c.relnamespace = current_schema()::regnamespace AND NOT tgisinternal
  UNION ALL
  SELECT 'function', proname, pg_get_functiondef(oid) FROM pg_proc WHERE pronamespace = current_schema()::regnamespace
  UNION ALL
  SELECT 'rights', relname, relacl::text
    FROM pg_class WHERE relnamespace = current_schema()::regnamespace AND relkind = 'r'
  ORDER BY 1, 2, 3`

interface Part { kind: string, name: string, definition: string | null }

const partsOf = (sequelize: Sequelize) => sequelize.query<Part>(everything, { type: QueryTypes.SELECT })

describe('migrations', () => {
  const scratch = useScratch({ migrated: false })
  const up = () => migrateUp(scratch.ownerUrl, roleOf(scratch.webUrl))

  it('are ordered by their names', () => {
    expect(names).toEqual([...names].sort())
    expect(new Set(names).size).toBe(names.length)
  })

  it('lead up, down and up again to the same schema', async () => {
    expect(await pendingMigrations(scratch.owner)).toEqual(names)
    expect(await up()).toEqual(names)
    const first = await partsOf(scratch.owner)
    expect(first.filter(part => part.kind === 'trigger').length).toBeGreaterThan(20)

    expect(await migrateDown(scratch.ownerUrl, 'all')).toEqual([...names].reverse())
    const left = (await partsOf(scratch.owner)).map(part => part.name)
    expect(left.filter(name => !/^"?SequelizeMeta/.test(name))).toEqual([])

    expect(await up()).toEqual(names)
    expect(await partsOf(scratch.owner)).toEqual(first)
  })

  it('are each done once', async () => {
    const before = await partsOf(scratch.owner)
    expect(await up()).toEqual([])
    expect(await partsOf(scratch.owner)).toEqual(before)
    expect(await pendingMigrations(scratch.web)).toEqual([])
  })

  it('go back one at a time', async () => {
    const newest = names.at(-1)
    expect(await migrateDown(scratch.ownerUrl, 1)).toEqual([newest])
    expect(await pendingMigrations(scratch.web)).toEqual([newest])
    expect(await up()).toEqual([newest])
  })

  it('take turns when two run at once', async () => {
    await migrateDown(scratch.ownerUrl, 'all')
    const both = await Promise.all([up(), up()])
    expect(both.map(done => done.length).sort()).toEqual([0, names.length])
  })
})
