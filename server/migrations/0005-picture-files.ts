import type { Migration } from './migration.ts';
import { keepShopsApart } from './row-security.ts';

// What has come is a receipt fact of its own, since bytes may come before the op that names them. Who sent them may
// have them back even while no row shows them.
const PICTURE_FILES = `
CREATE TABLE picture_files (
  shop_id uuid NOT NULL REFERENCES shops,
  kind text NOT NULL CHECK (kind IN ('photo', 'recording')),
  sha256 text NOT NULL,
  bytes integer,
  media_type text,
  width integer,
  height integer,
  full_at timestamptz,
  full_by uuid,
  thumb_bytes integer,
  thumb_type text,
  thumb_at timestamptz,
  thumb_by uuid,
  PRIMARY KEY (shop_id, kind, sha256),
  FOREIGN KEY (shop_id, full_by) REFERENCES people (shop_id, id),
  FOREIGN KEY (shop_id, thumb_by) REFERENCES people (shop_id, id)
);
GRANT SELECT, INSERT, UPDATE ON picture_files TO ribband_app;
${keepShopsApart('picture_files')}`;

/** What bytes of photos and recordings have come. */
export const migration: Migration = {
  name: '0005-picture-files',
  async up({ run }) {
    await run(PICTURE_FILES);
  },
};
