import type { Migration } from './migration.ts';
import { refersTo, rowTable } from './row-table.ts';

const PLACED = `  boat_id uuid NOT NULL,
  stage_id uuid,
  entry_id uuid,`;

const PLACED_KEYS = `${refersTo('boats', 'boat_id')},
  ${refersTo('stages', 'stage_id')},
  ${refersTo('entries', 'entry_id')}`;

function ofEntry(table: string): string {
  return `
CREATE INDEX ${table}_entry ON ${table} (shop_id, entry_id) WHERE entry_id IS NOT NULL;`;
}

const FINDINGS = `${rowTable('findings', `${PLACED}\n  row json NOT NULL,\n  ${PLACED_KEYS}`)};${ofEntry('findings')}`;
const SOUNDS = `${rowTable('sounds', `${PLACED}\n  row json NOT NULL,\n  ${PLACED_KEYS}`)};${ofEntry('sounds')}`;

const PHOTOS = `${rowTable(
  'photos',
  `${PLACED}
  finding_id uuid,
  sha256 text NOT NULL,
  author_id uuid NOT NULL,
  row json NOT NULL,
  ${PLACED_KEYS},
  ${refersTo('findings', 'finding_id')},
  ${refersTo('people', 'author_id')}`,
)};${ofEntry('photos')}
CREATE INDEX photos_sha256 ON photos (shop_id, sha256);`;

/** What is noted on a boat, by itself or with an entry: findings, what was found sound, photos. */
export const migration: Migration = {
  name: '0004-notes',
  async up({ run }) {
    for (const rows of [FINDINGS, SOUNDS, PHOTOS]) await run(rows);
  },
};
