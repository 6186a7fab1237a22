import type { Migration } from './types'

const columns: readonly [table: string, column: string][] = [
  ['calibrations', 'recorded_by'],
  ['concessions', 'by_user'],
  ['disturbances', 'by_user'],
  ['fastener_groups', 'created_by'],
  ['not_disturbed_marks', 'by_user'],
  ['releases', 'by_user'],
  ['repair_orders', 'opened_by'],
  ['second_checks', 'calibration_id'],
  ['second_checks', 'checked_by'],
  ['torque_spec_revisions', 'approved_by'],
  ['torque_spec_revisions', 'created_by'],
  ['torque_spec_revisions', 'withdrawn_by'],
  ['voids', 'by_user'],
]

/** Indexes for the foreign keys that no list needed one for: what a person did, what was checked under a calibration. */
export const foreignKeyIndexes: Migration = {
  name: '20261201000600-foreign-key-indexes',
  async up({ query, transaction }) {
    for (const [table, column] of columns) {
      await query.sequelize.query(`CREATE INDEX ${table}_${column} ON ${table} (shop_id, ${column})`, { transaction })
    }
  },
  async down({ query, transaction }) {
    for (const [table, column] of columns) {
      await query.sequelize.query(`DROP INDEX ${table}_${column}`, { transaction })
    }
  },
}
