import { randomBytes } from 'node:crypto';
import type { Migration } from './migration.ts';
import { keepShopsApart } from './row-security.ts';

// Roles belong to the whole cluster, so migrations of two databases may be making this one at the same time.
// Granting is left out where the owner has it, since that needs rights which not every owner has.
const APP_ROLE = `
DO $$
BEGIN
  FOR attempt IN 1..20 LOOP
    BEGIN
      IF NOT EXISTS (SELECT FROM pg_roles WHERE rolname = 'ribband_app') THEN
        CREATE ROLE ribband_app NOLOGIN NOSUPERUSER NOBYPASSRLS;
      END IF;
      IF NOT pg_has_role(current_user, 'ribband_app', 'USAGE') THEN
        EXECUTE format('GRANT ribband_app TO %I', current_user);
      END IF;
      RETURN;
    -- internal_error is how 'tuple concurrently updated' comes
    EXCEPTION WHEN duplicate_object OR unique_violation OR internal_error THEN
      PERFORM pg_sleep(0.05);
    END;
  END LOOP;
  RAISE EXCEPTION 'The role ribband_app could not be made: other migrations keep changing it.';
END $$`;

// One row for the whole installation; and which shops there are. Neither holds a shop's data.
const INSTALLATION = `
CREATE TABLE installation (
  only_one boolean PRIMARY KEY DEFAULT true CHECK (only_one),
  jwt_secret text NOT NULL,
  first_run_code_hash text
);
GRANT SELECT, UPDATE (first_run_code_hash) ON installation TO ribband_app;

CREATE TABLE known_shops (
  shop_id uuid PRIMARY KEY,
  created_at timestamptz NOT NULL DEFAULT now()
);
GRANT SELECT, INSERT ON known_shops TO ribband_app;

CREATE TABLE rate_limits (
  key text PRIMARY KEY,
  hits integer NOT NULL,
  resets_at timestamptz NOT NULL
);
CREATE INDEX rate_limits_resets_at ON rate_limits (resets_at);
GRANT SELECT, INSERT, UPDATE, DELETE ON rate_limits TO ribband_app`;

// seq is the last number given in the shop's feed, row_seq that of the shop's own row. A new incarnation tells
// devices that the server was restored from a backup.
const SHOPS = `
CREATE TABLE shops (
  shop_id uuid PRIMARY KEY REFERENCES known_shops,
  seq bigint NOT NULL DEFAULT 0,
  row_seq bigint NOT NULL DEFAULT 0,
  name text NOT NULL,
  time_zone text NOT NULL,
  currency text NOT NULL,
  units text NOT NULL,
  incarnation uuid NOT NULL DEFAULT gen_random_uuid(),
  row json NOT NULL
);
GRANT SELECT, INSERT, UPDATE ON shops TO ribband_app;
${keepShopsApart('shops')}`;

/** The app's role, the installation and its shops. */
export const migration: Migration = {
  name: '0001-shops',
  async up({ run }) {
    await run(APP_ROLE);
    await run(INSTALLATION);
    await run('INSERT INTO installation (jwt_secret) VALUES ($1)', [randomBytes(32).toString('base64url')]);
    await run(SHOPS);
  },
};
