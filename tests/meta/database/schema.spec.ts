import { QueryTypes } from 'sequelize'
import { describe, expect, it } from 'vitest'
import { appendOnlyTables } from '../../../server/db/append-only'
import { database } from '../../../server/db/index'
import { useDatabase } from '../../server/support/database'

describe('the schema', () => {
  useDatabase()
  const select = <Row extends object>(sql: string) => database().query<Row>(sql, { type: QueryTypes.SELECT })

  it('has an index for every foreign key', async () => {
    // Some index must begin with the key's columns, in any order; the shop alone does not count unless it is the key.
    const without = await select(`
      WITH foreign_keys AS (
        SELECT conrelid::regclass::text AS name, conname, array_agg(attname::text) AS columns
        FROM pg_constraint CROSS JOIN unnest(conkey) AS number
        JOIN pg_attribute ON attrelid = conrelid AND attnum = number
        WHERE contype = 'f' AND connamespace = 'public'::regnamespace GROUP BY 1, 2
      ), indexes AS (
        SELECT indrelid::regclass::text AS name, indexrelid, array_agg(attname::text ORDER BY place) AS columns
        FROM pg_index CROSS JOIN unnest(indkey) WITH ORDINALITY AS keys (number, place)
        LEFT JOIN pg_attribute ON attrelid = indrelid AND attnum = number
        WHERE indpred IS NULL GROUP BY 1, 2
      )
      SELECT name, conname FROM foreign_keys WHERE NOT EXISTS (
        SELECT FROM indexes CROSS JOIN generate_series(1, cardinality(foreign_keys.columns)) AS length
        WHERE indexes.name = foreign_keys.name AND indexes.columns[1:length] <@ foreign_keys.columns
          AND array_remove(foreign_keys.columns, 'shop_id') <@ indexes.columns[1:length]
      )`)
    expect(without).toEqual([])
  })

  it('has foreign keys that hold the shop and never cascade', async () => {
    const keys = await select<{ definition: string, name: string }>(`
      SELECT conname AS name, pg_get_constraintdef(oid) AS definition FROM pg_constraint
      WHERE contype = 'f' AND connamespace = 'public'::regnamespace`)
    expect(keys.length).toBeGreaterThan(30)
    for (const { name, definition } of keys) {
      expect(definition, name).toContain('ON DELETE RESTRICT')
      // A reading hangs on its point, whose calibration holds the shop.
      if (name !== 'calibration_readings_calibration_id_point_fkey') expect(definition, name).toContain('(shop_id')
    }
  })

  it('has the shop in every table but those of no shop', async () => {
    const without = await select<{ name: string }>(`
      SELECT relname AS name FROM pg_class WHERE relkind = 'r' AND relnamespace = 'public'::regnamespace
      AND NOT EXISTS (SELECT FROM pg_attribute WHERE attrelid = pg_class.oid AND attname = 'shop_id' AND attnotnull)
      ORDER BY 1`)
    expect(without.map(table => table.name)).toEqual(['SequelizeMeta', 'shops', 'sign_in_failures'])
  })

  it('guards every append-only table with triggers that nothing but their removal turns off', async () => {
    const triggers = await select<{ table: string, name: string, enabled: string }>(`
      SELECT tgrelid::regclass::text AS table, tgname AS name, tgenabled AS enabled FROM pg_trigger
      WHERE NOT tgisinternal ORDER BY 1, 2`)
    const expected = [...appendOnlyTables].sort().flatMap(table => [
      { table, name: `${table}_no_change`, enabled: 'A' }, { table, name: `${table}_no_truncate`, enabled: 'A' },
    ])
    expect(triggers.filter(trigger => !trigger.table.includes('.'))).toEqual(expected)
  })

  it('is what the models say', async () => {
    const columns = await select<{ table: string, column: string, nullable: boolean, type: string }>(`
      SELECT relname AS table, attname AS column, NOT attnotnull AS nullable, format_type(atttypid, atttypmod) AS type
      FROM pg_attribute JOIN pg_class ON pg_class.oid = attrelid
      WHERE relkind = 'r' AND relnamespace = 'public'::regnamespace AND attnum > 0 AND NOT attisdropped`)
    const words: Record<string, string> = {
      'TEXT': 'text', 'UUID': 'uuid', 'BOOLEAN': 'boolean', 'INTEGER': 'integer', 'SMALLINT': 'smallint',
      'BIGINT': 'bigint', 'DOUBLE PRECISION': 'double precision', 'DATE': 'date', 'JSON': 'json', 'JSONB': 'jsonb',
      'TIMESTAMP WITH TIME ZONE': 'timestamp with time zone', 'CHAR(64)': 'character(64)',
    }
    const told = Object.values(database().models).flatMap((model) => {
      return Object.values(model.getAttributes()).map(({ field, allowNull, type }) => ({
        table: model.tableName, column: field, nullable: allowNull, type: words[type.toString({})],
      }))
    })
    const sorted = (list: { table: string, column?: string }[]) =>
      [...list].sort((a, b) => `${a.table}.${a.column}`.localeCompare(`${b.table}.${b.column}`))
    const modelled = new Set(told.map(({ table }) => table))
    expect([...new Set(columns.map(({ table }) => table))].filter(table => !modelled.has(table)).sort())
      .toEqual(['SequelizeMeta', 'sign_in_failures'])
    expect(sorted(told)).toEqual(sorted(columns.filter(({ table }) => modelled.has(table))))
  })
})
