import type { Migration } from './migration.ts';
import { keepShopsApart } from './row-security.ts';
import { refersTo, rowTable } from './row-table.ts';

// What an op says may be wrong in any way, so nothing in it refers to another table; the device is the request's.
const OPS = `
CREATE TABLE ops (
  shop_id uuid NOT NULL,
  op_key text NOT NULL,
  op json NOT NULL,
  sha256 text NOT NULL,
  device_id uuid NOT NULL,
  person_id uuid,
  kind text,
  received_at timestamptz NOT NULL,
  received_on date NOT NULL,
  ordered_at text COLLATE "C" NOT NULL,
  ordered_on date NOT NULL,
  roles text[] NOT NULL,
  outcome text NOT NULL,
  reason text,
  PRIMARY KEY (shop_id, op_key),
  FOREIGN KEY (shop_id, device_id) REFERENCES devices (shop_id, id)
);
GRANT SELECT, INSERT ON ops TO ribband_app;
${keepShopsApart('ops')}

CREATE FUNCTION refuse_to_change_ops() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION 'Ops are kept as they came: % is refused.', TG_OP;
END $$;
CREATE TRIGGER kept_as_they_came BEFORE UPDATE OR DELETE OR TRUNCATE ON ops
  FOR EACH STATEMENT EXECUTE FUNCTION refuse_to_change_ops()`;

const BOATS = rowTable(
  'boats',
  `  name text NOT NULL,
  row json NOT NULL,
  FOREIGN KEY (shop_id) REFERENCES shops`,
);

const STAGES = rowTable(
  'stages',
  `  boat_id uuid NOT NULL,
  row json NOT NULL,
  ${refersTo('boats', 'boat_id')}`,
);

const TASKS = rowTable(
  'tasks',
  `  boat_id uuid NOT NULL,
  stage_id uuid,
  row json NOT NULL,
  ${refersTo('boats', 'boat_id')},
  ${refersTo('stages', 'stage_id')}`,
);

const ENTRIES = rowTable(
  'entries',
  `  boat_id uuid NOT NULL,
  stage_id uuid,
  work_date date NOT NULL,
  author_id uuid NOT NULL,
  row json NOT NULL,
  ${refersTo('boats', 'boat_id')},
  ${refersTo('stages', 'stage_id')},
  ${refersTo('people', 'author_id')}`,
);

// A closed loose end has no row: it is sent as gone.
const LOOSE_ENDS = rowTable(
  'loose_ends',
  `  entity text NOT NULL,
  row_id uuid NOT NULL,
  boat_id uuid,
  row json,
  FOREIGN KEY (shop_id) REFERENCES shops`,
);

const SET_ASIDES = rowTable(
  'set_asides',
  `  op_key text NOT NULL,
  reason text NOT NULL,
  state text NOT NULL,
  author_id uuid,
  awaits_entity text,
  awaits_id uuid,
  row json NOT NULL,
  FOREIGN KEY (shop_id) REFERENCES shops,
  FOREIGN KEY (shop_id, op_key) REFERENCES ops (shop_id, op_key) DEFERRABLE INITIALLY DEFERRED`,
);

const SET_ASIDE_AWAITS = `
CREATE INDEX set_asides_awaits ON set_asides (shop_id, awaits_id) WHERE awaits_id IS NOT NULL`;

const BOAT_OWNERS = `
CREATE TABLE boat_owners (
  shop_id uuid NOT NULL,
  boat_id uuid NOT NULL,
  person_id uuid NOT NULL,
  PRIMARY KEY (shop_id, boat_id, person_id),
  FOREIGN KEY (shop_id, boat_id) REFERENCES boats (shop_id, id),
  FOREIGN KEY (shop_id, person_id) REFERENCES people (shop_id, id)
);
GRANT SELECT, INSERT, DELETE ON boat_owners TO ribband_app;
${keepShopsApart('boat_owners')}`;

/** Every op that ever came, and the rows made of them. */
export const migration: Migration = {
  name: '0003-record',
  async up({ run }) {
    await run(OPS);
    for (const rows of [BOATS, STAGES, TASKS, ENTRIES, LOOSE_ENDS, SET_ASIDES]) await run(rows);
    await run(SET_ASIDE_AWAITS);
    await run(BOAT_OWNERS);
  },
};
