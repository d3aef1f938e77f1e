import { keepShopsApart } from './row-security.ts';

/** A table of a kind of row, numbered as the feed is; `columns` are those that keys, joins and sums need, and `row`. */
export function rowTable(table: string, columns: string): string {
  return `
CREATE TABLE ${table} (
  shop_id uuid NOT NULL,
  id uuid NOT NULL,
  seq bigint NOT NULL,
${columns},
  PRIMARY KEY (shop_id, id)
);
CREATE UNIQUE INDEX ${table}_seq ON ${table} (shop_id, seq);
GRANT SELECT, INSERT, UPDATE ON ${table} TO ribband_app;
${keepShopsApart(table)}`;
}

/** Deferrable, so that a batch may write its rows in any order. */
export function refersTo(table: string, column: string): string {
  return `FOREIGN KEY (shop_id, ${column}) REFERENCES ${table} (shop_id, id) DEFERRABLE INITIALLY IMMEDIATE`;
}
