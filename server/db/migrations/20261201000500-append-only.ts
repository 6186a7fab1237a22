import type { Migration } from './types'

/** As they stood at this migration; a table that comes later brings its triggers in a migration of its own. */
const tables = [
  'sign_offs', 'sign_off_readings', 'voids', 'second_checks', 'second_check_readings', 'disturbances', 'concessions',
  'not_disturbed_marks', 'releases', 'calibrations', 'calibration_points', 'calibration_readings', 'log_entries',
] as const

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
    for (const table of tables) {
      await query.sequelize.query(`
        CREATE TRIGGER ${table}_no_change BEFORE UPDATE OR DELETE ON ${table} FOR EACH ROW EXECUTE FUNCTION refuse_change();
        CREATE TRIGGER ${table}_no_truncate BEFORE TRUNCATE ON ${table} FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
        ALTER TABLE ${table} ENABLE ALWAYS TRIGGER ${table}_no_change;
        ALTER TABLE ${table} ENABLE ALWAYS TRIGGER ${table}_no_truncate;
      `, { transaction })
    }
  },
  async down({ query, transaction }) {
    for (const table of tables) {
      await query.sequelize.query(`
        DROP TRIGGER ${table}_no_change ON ${table};
        DROP TRIGGER ${table}_no_truncate ON ${table};
      `, { transaction })
    }
    await query.sequelize.query('DROP FUNCTION refuse_change()', { transaction })
  },
}
