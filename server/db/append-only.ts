/** Tables whose rows are only ever added. The database rejects UPDATE, DELETE and TRUNCATE on them. */
export const appendOnlyTables = [
  'sign_offs', 'sign_off_readings', 'voids', 'second_checks', 'second_check_readings', 'disturbances', 'concessions',
  'not_disturbed_marks', 'releases', 'calibrations', 'calibration_points', 'calibration_readings', 'log_entries',
] as const
