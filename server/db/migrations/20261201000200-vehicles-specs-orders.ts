import type { Migration } from './types'

/** Vehicles, torque specs with their revisions, repair orders, fastener groups and positions. */
export const vehiclesSpecsOrders: Migration = {
  name: '20261201000200-vehicles-specs-orders',
  async up({ query, transaction }) {
    await query.sequelize.query(`
      CREATE TABLE vehicles (
        id uuid PRIMARY KEY,
        shop_id uuid NOT NULL REFERENCES shops ON DELETE RESTRICT,
        vin text CHECK (vin ~ '^[A-HJ-NPR-Z0-9]{17}$'),
        vin_unverified boolean NOT NULL DEFAULT false,
        unit_number text,
        plate text,
        year integer CHECK (year BETWEEN 1900 AND 2100),
        make text NOT NULL,
        model text NOT NULL,
        engine text,
        odometer integer CHECK (odometer >= 0),
        created_at timestamptz NOT NULL,
        UNIQUE (shop_id, id),
        UNIQUE (shop_id, vin),
        UNIQUE (shop_id, unit_number)
      );
      CREATE INDEX vehicles_created ON vehicles (shop_id, created_at, id);
      CREATE INDEX vehicles_make ON vehicles (shop_id, make, id);

      CREATE TABLE torque_specs (
        id uuid PRIMARY KEY,
        shop_id uuid NOT NULL REFERENCES shops ON DELETE RESTRICT,
        kind text NOT NULL CHECK (kind IN ('joint', 'general_table')),
        component text NOT NULL,
        application text NOT NULL,
        applies_to jsonb,
        -- Hash of the imported row, so that the same row twice is known for what it is.
        import_key char(64),
        created_at timestamptz NOT NULL,
        UNIQUE (shop_id, id),
        UNIQUE (shop_id, import_key)
      );
      CREATE INDEX torque_specs_component ON torque_specs (shop_id, component, id);
      CREATE INDEX torque_specs_application ON torque_specs (shop_id, application, id);
      CREATE INDEX torque_specs_created ON torque_specs (shop_id, created_at, id);

      CREATE TABLE torque_spec_revisions (
        id uuid PRIMARY KEY,
        shop_id uuid NOT NULL,
        spec_id uuid NOT NULL,
        number integer NOT NULL CHECK (number >= 1),
        status text NOT NULL CHECK (status IN ('draft', 'approved', 'withdrawn')),
        joint_class text NOT NULL CHECK (joint_class IN ('safety', 'sealing', 'general')),
        bolt_count integer CHECK (bolt_count BETWEEN 1 AND 120),
        pattern text CHECK (pattern IN ('circle', 'row', 'two_rows', 'free')),
        places jsonb NOT NULL DEFAULT '[]',
        thread text,
        left_hand boolean NOT NULL DEFAULT false,
        property_class text,
        thread_condition text,
        running_torque jsonb,
        preparation jsonb NOT NULL DEFAULT '[]',
        target_value double precision CHECK (target_value > 0),
        target_unit text,
        printed_value double precision CHECK (printed_value > 0),
        printed_unit text,
        printed_limits jsonb,
        tolerance jsonb,
        stages jsonb,
        printed_order jsonb,
        second_check_required boolean NOT NULL DEFAULT false,
        one_time_use boolean NOT NULL DEFAULT false,
        retorque jsonb,
        caution text,
        source_title text NOT NULL,
        source_section text,
        source_page text,
        source_date text,
        -- What the printed values come to, in N·m, by the value that governs.
        target_nm double precision NOT NULL CHECK (target_nm > 0),
        lower_nm double precision NOT NULL CHECK (lower_nm > 0),
        upper_nm double precision NOT NULL,
        flags jsonb NOT NULL DEFAULT '[]',
        governs text CHECK (governs IN ('target', 'printed')),
        shop_value boolean NOT NULL DEFAULT false,
        reasoning text,
        created_by uuid NOT NULL,
        created_at timestamptz NOT NULL,
        approved_by uuid,
        approved_at timestamptz,
        withdrawn_by uuid,
        withdrawn_at timestamptz,
        withdrawn_reason text,
        CHECK (lower_nm < upper_nm AND target_nm BETWEEN lower_nm AND upper_nm),
        CHECK ((target_value IS NULL) = (target_unit IS NULL)),
        CHECK ((printed_value IS NULL) = (printed_unit IS NULL)),
        CHECK (status <> 'approved' OR (approved_by IS NOT NULL AND approved_at IS NOT NULL)),
        CHECK (NOT (shop_value AND joint_class = 'safety')),
        UNIQUE (shop_id, id),
        UNIQUE (spec_id, number),
        FOREIGN KEY (shop_id, spec_id) REFERENCES torque_specs (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, created_by) REFERENCES users (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, approved_by) REFERENCES users (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, withdrawn_by) REFERENCES users (shop_id, id) ON DELETE RESTRICT
      );
      CREATE INDEX torque_spec_revisions_spec ON torque_spec_revisions (shop_id, spec_id, number);
      CREATE INDEX torque_spec_revisions_target ON torque_spec_revisions (shop_id, target_nm, id);

      CREATE TABLE repair_orders (
        id uuid PRIMARY KEY,
        shop_id uuid NOT NULL REFERENCES shops ON DELETE RESTRICT,
        number text NOT NULL,
        vehicle_id uuid NOT NULL,
        complaint text,
        odometer integer CHECK (odometer >= 0),
        bay text,
        opened_at timestamptz NOT NULL,
        opened_by uuid NOT NULL,
        UNIQUE (shop_id, id),
        UNIQUE (shop_id, number),
        FOREIGN KEY (shop_id, vehicle_id) REFERENCES vehicles (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, opened_by) REFERENCES users (shop_id, id) ON DELETE RESTRICT
      );
      CREATE INDEX repair_orders_opened ON repair_orders (shop_id, opened_at, id);
      CREATE INDEX repair_orders_number ON repair_orders (shop_id, number, id);
      CREATE INDEX repair_orders_vehicle ON repair_orders (shop_id, vehicle_id);

      -- A group is the row that is locked while a joint is signed: append-only rows cannot be.
      CREATE TABLE fastener_groups (
        id uuid PRIMARY KEY,
        shop_id uuid NOT NULL,
        repair_order_id uuid NOT NULL,
        spec_revision_id uuid NOT NULL,
        name text NOT NULL CHECK (length(name) BETWEEN 1 AND 160),
        bolt_count integer NOT NULL CHECK (bolt_count BETWEEN 1 AND 120),
        pattern text NOT NULL CHECK (pattern IN ('circle', 'row', 'two_rows', 'free')),
        tightening_order jsonb NOT NULL,
        created_by uuid NOT NULL,
        created_at timestamptz NOT NULL,
        UNIQUE (shop_id, id),
        FOREIGN KEY (shop_id, repair_order_id) REFERENCES repair_orders (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, spec_revision_id) REFERENCES torque_spec_revisions (shop_id, id) ON DELETE RESTRICT,
        FOREIGN KEY (shop_id, created_by) REFERENCES users (shop_id, id) ON DELETE RESTRICT
      );
      CREATE INDEX fastener_groups_order ON fastener_groups (shop_id, repair_order_id, created_at);
      CREATE INDEX fastener_groups_revision ON fastener_groups (shop_id, spec_revision_id);

      CREATE TABLE fastener_positions (
        group_id uuid NOT NULL,
        shop_id uuid NOT NULL,
        position integer NOT NULL CHECK (position BETWEEN 1 AND 120),
        x double precision CHECK (x BETWEEN 0 AND 1000),
        y double precision CHECK (y BETWEEN 0 AND 1000),
        long boolean NOT NULL DEFAULT false,
        label text,
        PRIMARY KEY (group_id, position),
        FOREIGN KEY (shop_id, group_id) REFERENCES fastener_groups (shop_id, id) ON DELETE RESTRICT
      );
      CREATE INDEX fastener_positions_group ON fastener_positions (shop_id, group_id);
    `, { transaction })
  },
  async down({ query, transaction }) {
    const tables = ['fastener_positions', 'fastener_groups', 'repair_orders', 'torque_spec_revisions', 'torque_specs', 'vehicles']
    for (const table of tables) await query.dropTable(table, { transaction })
  },
}
