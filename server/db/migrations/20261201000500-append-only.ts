import { appendOnlyTables } from '../append-only'
import type { Migration } from './types'

/**
 * Triggers that keep signed records as they were signed, against every role, the owner included.
 * The owner could still drop a trigger; the hash chain of the log is what shows that.
 */
export const appendOnly: Migration = {
  name: '20261201000500-append-only',
  async up({ query, transaction }) {
    await query.sequelize.query(`
      CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
      BEGIN
        RAISE EXCEPTION 'rows of % are only ever added', TG_TABLE_NAME USING ERRCODE = 'restrict_violation';
      END $$;
    `, { transaction })
    for (const table of appendOnlyTables) {
      await query.sequelize.query(`
        CREATE TRIGGER ${table}_no_change BEFORE UPDATE OR DELETE ON ${table} FOR EACH ROW EXECUTE FUNCTION refuse_change();
        CREATE TRIGGER ${table}_no_truncate BEFORE TRUNCATE ON ${table} FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
        ALTER TABLE ${table} ENABLE ALWAYS TRIGGER ${table}_no_change;
        ALTER TABLE ${table} ENABLE ALWAYS TRIGGER ${table}_no_truncate;
      `, { transaction })
    }
  },
  async down({ query, transaction }) {
    for (const table of appendOnlyTables) {
      await query.sequelize.query(`
        DROP TRIGGER ${table}_no_change ON ${table};
        DROP TRIGGER ${table}_no_truncate ON ${table};
      `, { transaction })
    }
    await query.sequelize.query('DROP FUNCTION refuse_change()', { transaction })
  },
}
