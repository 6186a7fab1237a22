import type { Migration } from './types'

/** Wrenches, their calibrations, the points and readings of each. */
export const wrenchesCalibrations: Migration = {
  name: '20261201000300-wrenches-calibrations',
  async up({ query, transaction }) {
    await query.sequelize.query(`
      CREATE TABLE wrenches (
        id uuid PRIMARY KEY,
        shop_id uuid NOT NULL REFERENCES shops ON DELETE RESTRICT,
        asset_tag text NOT NULL,
        serial text NOT NULL,
        kind text NOT NULL CHECK (kind IN ('setting', 'indicating')),
        tool_class text,
        range_min double precision NOT NULL CHECK (range_min > 0),
        range_max double precision NOT NULL,
        range_unit text NOT NULL,
        range_min_nm double precision NOT NULL CHECK (range_min_nm > 0),
        range_max_nm double precision NOT NULL,
        graduation_value double precision CHECK (graduation_value > 0),
        graduation_unit text,
        graduation_nm double precision,
        grip_length_mm double precision CHECK (grip_length_mm > 0),
        drive text,
        directions jsonb,
        permissible_percent double precision NOT NULL CHECK (permissible_percent > 0 AND permissible_percent <= 20),
        interval_months integer NOT NULL CHECK (interval_months BETWEEN 1 AND 120),
        interval_cycles integer CHECK (interval_cycles > 0),
        location text,
        state text NOT NULL DEFAULT 'in_use' CHECK (state IN ('in_use', 'quarantined', 'at_laboratory', 'lost', 'retired')),
        state_reason text,
        created_at timestamptz NOT NULL,
        CHECK (range_min < range_max AND range_min_nm < range_max_nm),
        CHECK ((graduation_value IS NULL) = (graduation_unit IS NULL)),
        UNIQUE (shop_id, id),
        UNIQUE (shop_id, asset_tag)
      );
      CREATE INDEX wrenches_tag ON wrenches (shop_id, asset_tag, id);

      CREATE TABLE calibrations (
        id uuid PRIMARY KEY,
        shop_id uuid NOT NULL,
        wrench_id uuid NOT NULL,
        performed_on date NOT NULL,
        laboratory text NOT NULL,
        certificate_number text NOT NULL,
        reference_uncertainty_percent double precision NOT NULL CHECK (reference_uncertainty_percent >= 0),
        as_found_unavailable_reason text,
        adjusted boolean NOT NULL,
        note text,
        result text NOT NULL CHECK (result IN ('pass', 'fail')),
        usable boolean NOT NULL,
        decision_rule text NOT NULL,
        due_on date NOT NULL,
        recorded_by uuid NOT NULL,
        recorded_at timestamptz NOT NULL,
        CHECK (due_on > performed_on),
        UNIQUE (shop_id, id),
        UNIQUE (wrench_id, certificate_number),
        FOREIGN KEY (shop_id, wrench_id) REFERENCES wrenches (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, recorded_by) REFERENCES users (shop_id, id) ON DELETE RESTRICT
      );
      -- The calibration in force on a day: newest performed_on up to it.
      CREATE INDEX calibrations_in_force ON calibrations (shop_id, wrench_id, performed_on DESC, recorded_at DESC);

      CREATE TABLE calibration_points (
        calibration_id uuid NOT NULL,
        shop_id uuid NOT NULL,
        number integer NOT NULL CHECK (number >= 1),
        phase text NOT NULL CHECK (phase IN ('as_found', 'as_left')),
        direction text CHECK (direction IN ('clockwise', 'anticlockwise')),
        target_value double precision NOT NULL CHECK (target_value > 0),
        target_unit text NOT NULL,
        target_nm double precision NOT NULL CHECK (target_nm > 0),
        mean_deviation_percent double precision NOT NULL,
        limit_percent double precision NOT NULL CHECK (limit_percent > 0),
        verdict text NOT NULL CHECK (verdict IN ('pass', 'fail')),
        w_percent double precision,
        w_prime_percent double precision,
        PRIMARY KEY (calibration_id, number),
        FOREIGN KEY (shop_id, calibration_id) REFERENCES calibrations (shop_id, id) ON DELETE RESTRICT
      );
      CREATE INDEX calibration_points_calibration ON calibration_points (shop_id, calibration_id);

      CREATE TABLE calibration_readings (
        calibration_id uuid NOT NULL,
        point integer NOT NULL,
        number integer NOT NULL CHECK (number >= 1),
        shop_id uuid NOT NULL REFERENCES shops ON DELETE RESTRICT,
        indicated double precision NOT NULL CHECK (indicated > 0),
        reference double precision NOT NULL CHECK (reference > 0),
        deviation_percent double precision NOT NULL,
        PRIMARY KEY (calibration_id, point, number),
        FOREIGN KEY (calibration_id, point) REFERENCES calibration_points (calibration_id, number) ON DELETE RESTRICT
      );
      CREATE INDEX calibration_readings_shop ON calibration_readings (shop_id, calibration_id);
    `, { transaction })
  },
  async down({ query, transaction }) {
    for (const table of ['calibration_readings', 'calibration_points', 'calibrations', 'wrenches']) await query.dropTable(table, { transaction })
  },
}
