import type { Migration } from './types'

/** Shops, their people and sessions; counters of failed sign-ins. */
export const shopsAndPeople: Migration = {
  name: '20261201000100-shops-and-people',
  async up({ query, transaction }) {
    await query.sequelize.query(`
      CREATE TABLE shops (
        id uuid PRIMARY KEY,
        name text NOT NULL CHECK (length(name) BETWEEN 1 AND 120),
        time_zone text NOT NULL DEFAULT 'UTC',
        default_tolerance_percent double precision NOT NULL DEFAULT 10 CHECK (default_tolerance_percent > 0 AND default_tolerance_percent < 100),
        due_soon_days integer NOT NULL DEFAULT 30 CHECK (due_soon_days BETWEEN 0 AND 365),
        unfit_wrench text NOT NULL DEFAULT 'refuse' CHECK (unfit_wrench IN ('refuse', 'exception')),
        approve_own_draft boolean NOT NULL DEFAULT true,
        release_own_joint boolean NOT NULL DEFAULT false,
        log_sequence bigint NOT NULL DEFAULT 0 CHECK (log_sequence >= 0),
        log_hash char(64) NOT NULL DEFAULT repeat('0', 64),
        created_at timestamptz NOT NULL
      );
      CREATE TABLE users (
        id uuid PRIMARY KEY,
        shop_id uuid NOT NULL REFERENCES shops ON DELETE RESTRICT,
        name text NOT NULL CHECK (length(name) BETWEEN 1 AND 100),
        email text NOT NULL CHECK (email = lower(email)),
        role text NOT NULL CHECK (role IN ('technician', 'foreman', 'quality_lead', 'advisor', 'administrator')),
        active boolean NOT NULL DEFAULT true,
        passphrase_hash text NOT NULL,
        must_change_passphrase boolean NOT NULL DEFAULT false,
        pin_verifier text,
        pin_failures integer NOT NULL DEFAULT 0 CHECK (pin_failures BETWEEN 0 AND 10),
        created_at timestamptz NOT NULL,
        UNIQUE (email),
        UNIQUE (shop_id, id)
      );
      CREATE INDEX users_shop_name ON users (shop_id, name, id);
      CREATE TABLE sessions (
        id uuid PRIMARY KEY,
        shop_id uuid NOT NULL,
        user_id uuid NOT NULL,
        device text NOT NULL,
        created_at timestamptz NOT NULL,
        seen_at timestamptz NOT NULL,
        ended_at timestamptz,
        FOREIGN KEY (shop_id, user_id) REFERENCES users (shop_id, id) ON DELETE RESTRICT
      );
      CREATE INDEX sessions_user ON sessions (shop_id, user_id, seen_at);
      -- Rows of rate-limiter-flexible.
      CREATE TABLE sign_in_failures (
        key varchar(255) PRIMARY KEY,
        points integer NOT NULL DEFAULT 0,
        expire bigint
      );
    `, { transaction })
  },
  async down({ query, transaction }) {
    for (const table of ['sign_in_failures', 'sessions', 'users', 'shops']) await query.dropTable(table, { transaction })
  },
}
