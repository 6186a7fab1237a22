import type { Migration } from './types'

/** Sign-offs with all that was true then, what follows them, and the shop's hash-chained log. */
export const signOffsAndLog: Migration = {
  name: '20261201000400-sign-offs-and-log',
  async up({ query, transaction }) {
    await query.sequelize.query(`
      CREATE TABLE sign_offs (
        id uuid PRIMARY KEY,
        shop_id uuid NOT NULL,
        fastener_group_id uuid NOT NULL,
        repair_order_id uuid NOT NULL,
        spec_revision_id uuid NOT NULL,
        wrench_id uuid NOT NULL,
        calibration_id uuid,
        technician_id uuid NOT NULL,
        signed_at timestamptz NOT NULL,
        received_at timestamptz NOT NULL,
        tightened_at timestamptz,
        captured_offline boolean NOT NULL,
        device_id uuid,
        device_signature jsonb,
        supersedes_id uuid,
        supersedes_reason text,
        adapter jsonb,
        multiplier_ratio double precision CHECK (multiplier_ratio >= 1),
        attested_in_order boolean NOT NULL DEFAULT false,
        preparation jsonb NOT NULL,
        prep_reason text,
        deviation_reason text,
        parts jsonb NOT NULL DEFAULT '[]',
        note text,
        verdict text CHECK (verdict IN ('in_band', 'edge', 'low', 'high')),
        exceptions jsonb NOT NULL DEFAULT '[]',
        target_value double precision,
        target_unit text,
        lower_nm double precision NOT NULL,
        upper_nm double precision NOT NULL,
        decision_rule text NOT NULL,
        bias_percent double precision,
        w_percent double precision,
        w_prime_percent double precision,
        u_nm double precision,
        probability_in_band double precision CHECK (probability_in_band BETWEEN 0 AND 1),
        calibration_status text NOT NULL,
        wrench_kind text NOT NULL,
        wrench_serial text NOT NULL,
        bolt_count integer NOT NULL,
        -- The sort keys of the list, copied in as they were when it was signed.
        repair_order_number text NOT NULL,
        component text NOT NULL,
        target_nm double precision NOT NULL,
        verdict_rank smallint NOT NULL CHECK (verdict_rank BETWEEN 0 AND 4),
        wrench_tag text NOT NULL,
        calibration_due_on date,
        technician_name text NOT NULL,
        -- Exactly once: hash of what was sent, and the answer it got.
        content_hash char(64) NOT NULL,
        answer json NOT NULL,
        log_sequence bigint NOT NULL,
        CHECK (supersedes_id IS NULL OR supersedes_reason IS NOT NULL),
        UNIQUE (shop_id, id),
        UNIQUE (shop_id, log_sequence),
        UNIQUE (supersedes_id),
        FOREIGN KEY (shop_id, fastener_group_id) REFERENCES fastener_groups (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, repair_order_id) REFERENCES repair_orders (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, spec_revision_id) REFERENCES torque_spec_revisions (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, wrench_id) REFERENCES wrenches (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, calibration_id) REFERENCES calibrations (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, technician_id) REFERENCES users (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, supersedes_id) REFERENCES sign_offs (shop_id, id) ON DELETE RESTRICT
      );
      -- One index for each sortable column of the list of sign-offs.
      CREATE INDEX sign_offs_signed_at ON sign_offs (shop_id, signed_at, id);
      CREATE INDEX sign_offs_repair_order ON sign_offs (shop_id, repair_order_number, id);
      CREATE INDEX sign_offs_component ON sign_offs (shop_id, component, id);
      CREATE INDEX sign_offs_target ON sign_offs (shop_id, target_nm, id);
      CREATE INDEX sign_offs_verdict ON sign_offs (shop_id, verdict_rank, id);
      CREATE INDEX sign_offs_wrench_tag ON sign_offs (shop_id, wrench_tag, id);
      CREATE INDEX sign_offs_due ON sign_offs (shop_id, coalesce(calibration_due_on, 'infinity'::date), id);
      CREATE INDEX sign_offs_technician ON sign_offs (shop_id, technician_name, id);
      CREATE INDEX sign_offs_group ON sign_offs (shop_id, fastener_group_id);
      CREATE INDEX sign_offs_order ON sign_offs (shop_id, repair_order_id);
      CREATE INDEX sign_offs_wrench ON sign_offs (shop_id, wrench_id, signed_at);
      CREATE INDEX sign_offs_revision ON sign_offs (shop_id, spec_revision_id);
      CREATE INDEX sign_offs_calibration ON sign_offs (shop_id, calibration_id);
      CREATE INDEX sign_offs_technician_id ON sign_offs (shop_id, technician_id, signed_at);

      CREATE TABLE sign_off_readings (
        sign_off_id uuid NOT NULL,
        shop_id uuid NOT NULL,
        position integer NOT NULL,
        stage integer NOT NULL CHECK (stage >= 1),
        attempt integer NOT NULL CHECK (attempt >= 1),
        counts boolean NOT NULL,
        value double precision CHECK (value > 0),
        unit text,
        nm double precision,
        verdict text CHECK (verdict IN ('in_band', 'edge', 'low', 'high')),
        probability_in_band double precision CHECK (probability_in_band BETWEEN 0 AND 1),
        PRIMARY KEY (sign_off_id, position, stage, attempt),
        FOREIGN KEY (shop_id, sign_off_id) REFERENCES sign_offs (shop_id, id) ON DELETE RESTRICT
      );
      CREATE INDEX sign_off_readings_shop ON sign_off_readings (shop_id, sign_off_id);

      CREATE TABLE voids (
        id uuid PRIMARY KEY,
        shop_id uuid NOT NULL,
        sign_off_id uuid NOT NULL UNIQUE,
        reason text NOT NULL,
        at timestamptz NOT NULL,
        by_user uuid NOT NULL,
        log_sequence bigint NOT NULL,
        FOREIGN KEY (shop_id, sign_off_id) REFERENCES sign_offs (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, by_user) REFERENCES users (shop_id, id) ON DELETE RESTRICT
      );
      CREATE INDEX voids_sign_off ON voids (shop_id, sign_off_id);

      CREATE TABLE second_checks (
        id uuid PRIMARY KEY,
        shop_id uuid NOT NULL,
        sign_off_id uuid NOT NULL,
        method text NOT NULL CHECK (method IN ('witness', 'setting', 'residual')),
        wrench_id uuid,
        calibration_id uuid,
        calibration_status text,
        adapter jsonb,
        verdict text CHECK (verdict IN ('in_band', 'edge', 'low', 'high')),
        passed boolean NOT NULL,
        exceptions jsonb NOT NULL DEFAULT '[]',
        note text,
        at timestamptz NOT NULL,
        received_at timestamptz NOT NULL,
        captured_offline boolean NOT NULL,
        device_id uuid,
        device_signature jsonb,
        checked_by uuid NOT NULL,
        content_hash char(64) NOT NULL,
        answer json NOT NULL,
        log_sequence bigint NOT NULL,
        CHECK (method = 'witness' OR wrench_id IS NOT NULL),
        UNIQUE (shop_id, id),
        FOREIGN KEY (shop_id, sign_off_id) REFERENCES sign_offs (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, wrench_id) REFERENCES wrenches (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, calibration_id) REFERENCES calibrations (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, checked_by) REFERENCES users (shop_id, id) ON DELETE RESTRICT
      );
      CREATE INDEX second_checks_sign_off ON second_checks (shop_id, sign_off_id);
      CREATE INDEX second_checks_wrench ON second_checks (shop_id, wrench_id);

      CREATE TABLE second_check_readings (
        second_check_id uuid NOT NULL,
        shop_id uuid NOT NULL,
        position integer NOT NULL,
        value double precision NOT NULL CHECK (value > 0),
        unit text NOT NULL,
        nm double precision NOT NULL,
        turned boolean NOT NULL,
        PRIMARY KEY (second_check_id, position),
        FOREIGN KEY (shop_id, second_check_id) REFERENCES second_checks (shop_id, id) ON DELETE RESTRICT
      );
      CREATE INDEX second_check_readings_shop ON second_check_readings (shop_id, second_check_id);

      CREATE TABLE disturbances (
        id uuid PRIMARY KEY,
        shop_id uuid NOT NULL,
        fastener_group_id uuid NOT NULL,
        reason text NOT NULL,
        at timestamptz NOT NULL,
        by_user uuid NOT NULL,
        log_sequence bigint NOT NULL,
        FOREIGN KEY (shop_id, fastener_group_id) REFERENCES fastener_groups (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, by_user) REFERENCES users (shop_id, id) ON DELETE RESTRICT
      );
      CREATE INDEX disturbances_group ON disturbances (shop_id, fastener_group_id);

      CREATE TABLE concessions (
        id uuid PRIMARY KEY,
        shop_id uuid NOT NULL,
        fastener_group_id uuid NOT NULL,
        reason text NOT NULL,
        at timestamptz NOT NULL,
        by_user uuid NOT NULL,
        log_sequence bigint NOT NULL,
        FOREIGN KEY (shop_id, fastener_group_id) REFERENCES fastener_groups (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, by_user) REFERENCES users (shop_id, id) ON DELETE RESTRICT
      );
      CREATE INDEX concessions_group ON concessions (shop_id, fastener_group_id);

      CREATE TABLE not_disturbed_marks (
        id uuid PRIMARY KEY,
        shop_id uuid NOT NULL,
        fastener_group_id uuid NOT NULL UNIQUE,
        reason text NOT NULL,
        at timestamptz NOT NULL,
        by_user uuid NOT NULL,
        log_sequence bigint NOT NULL,
        FOREIGN KEY (shop_id, fastener_group_id) REFERENCES fastener_groups (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, by_user) REFERENCES users (shop_id, id) ON DELETE RESTRICT
      );
      CREATE INDEX not_disturbed_marks_group ON not_disturbed_marks (shop_id, fastener_group_id);

      CREATE TABLE releases (
        id uuid PRIMARY KEY,
        shop_id uuid NOT NULL,
        repair_order_id uuid NOT NULL UNIQUE,
        at timestamptz NOT NULL,
        by_user uuid NOT NULL,
        own_joint boolean NOT NULL,
        log_sequence bigint NOT NULL,
        FOREIGN KEY (shop_id, repair_order_id) REFERENCES repair_orders (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, by_user) REFERENCES users (shop_id, id) ON DELETE RESTRICT
      );
      CREATE INDEX releases_order ON releases (shop_id, repair_order_id);

      CREATE TABLE log_entries (
        shop_id uuid NOT NULL REFERENCES shops ON DELETE RESTRICT,
        sequence bigint NOT NULL CHECK (sequence >= 1),
        kind text NOT NULL CHECK (kind ~ '^[a-z_]+[.][a-z_]+$'),
        subject uuid NOT NULL,
        actor uuid,
        at timestamptz NOT NULL,
        -- Canonical JSON (RFC 8785) of what was recorded; text, so that not a byte of it changes.
        content text NOT NULL,
        previous_hash char(64) NOT NULL,
        hash char(64) NOT NULL,
        PRIMARY KEY (shop_id, sequence),
        UNIQUE (shop_id, hash)
      );
      CREATE INDEX log_entries_subject ON log_entries (shop_id, subject);
    `, { transaction })
  },
  async down({ query, transaction }) {
    const tables = [
      'log_entries', 'releases', 'not_disturbed_marks', 'concessions', 'disturbances', 'second_check_readings',
      'second_checks', 'voids', 'sign_off_readings', 'sign_offs',
    ]
    for (const table of tables) await query.dropTable(table, { transaction })
  },
}
