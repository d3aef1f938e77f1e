import type { Migration } from './migration.ts';
import { keepShopsApart } from './row-security.ts';

// E-mails are kept in lower case: comparing the bare column is leakproof, so its index serves under row security.
const PEOPLE = `
CREATE TABLE people (
  shop_id uuid NOT NULL REFERENCES shops,
  id uuid NOT NULL,
  seq bigint NOT NULL,
  name text NOT NULL,
  email text NOT NULL CHECK (email = lower(email)),
  password_hash text NOT NULL,
  roles text[] NOT NULL,
  left_at timestamptz,
  feed_epoch integer NOT NULL DEFAULT 0,
  row json NOT NULL,
  PRIMARY KEY (shop_id, id)
);
CREATE UNIQUE INDEX people_seq ON people (shop_id, seq);
CREATE UNIQUE INDEX people_email ON people (email, shop_id);
GRANT SELECT, INSERT, UPDATE ON people TO ribband_app;
${keepShopsApart('people')}
CREATE POLICY signing_in ON people FOR SELECT USING (email = current_setting('ribband.sign_in_email', true))`;

const DEVICES = `
CREATE TABLE devices (
  shop_id uuid NOT NULL REFERENCES shops,
  id uuid NOT NULL,
  seq bigint NOT NULL,
  label text NOT NULL,
  replaces uuid,
  person_id uuid,
  last_heard_at timestamptz,
  app_version text,
  held json,
  last_ordered_at text COLLATE "C",
  revoked_at timestamptz,
  row json NOT NULL,
  PRIMARY KEY (shop_id, id),
  FOREIGN KEY (shop_id, replaces) REFERENCES devices (shop_id, id),
  FOREIGN KEY (shop_id, person_id) REFERENCES people (shop_id, id)
);
CREATE UNIQUE INDEX devices_seq ON devices (shop_id, seq);
GRANT SELECT, INSERT, UPDATE ON devices TO ribband_app;
${keepShopsApart('devices')}

CREATE TABLE device_people (
  shop_id uuid NOT NULL,
  device_id uuid NOT NULL,
  person_id uuid NOT NULL,
  PRIMARY KEY (shop_id, device_id, person_id),
  FOREIGN KEY (shop_id, device_id) REFERENCES devices (shop_id, id),
  FOREIGN KEY (shop_id, person_id) REFERENCES people (shop_id, id)
);
GRANT SELECT, INSERT ON device_people TO ribband_app;
${keepShopsApart('device_people')}

CREATE TABLE refresh_families (
  shop_id uuid NOT NULL,
  id uuid NOT NULL,
  device_id uuid NOT NULL,
  person_id uuid NOT NULL,
  used integer NOT NULL DEFAULT 0,
  ended_at timestamptz,
  last_used_at timestamptz NOT NULL,
  PRIMARY KEY (shop_id, id),
  FOREIGN KEY (shop_id, device_id) REFERENCES devices (shop_id, id),
  FOREIGN KEY (shop_id, person_id) REFERENCES people (shop_id, id)
);
CREATE INDEX refresh_families_device ON refresh_families (shop_id, device_id) WHERE ended_at IS NULL;
GRANT SELECT, INSERT, UPDATE ON refresh_families TO ribband_app;
${keepShopsApart('refresh_families')}`;

/** People, their devices and what keeps them signed in. */
export const migration: Migration = {
  name: '0002-identity',
  async up({ run }) {
    await run(PEOPLE);
    await run(DEVICES);
  },
};
