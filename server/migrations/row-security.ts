/** The shop that a transaction is in, as set by `inShop`; null where none is set. */
const CURRENT_SHOP = `nullif(current_setting('ribband.shop_id', true), '')::uuid`;

/** SQL that keeps a table's rows to the shop of the transaction, for the table's owner too. */
export function keepShopsApart(table: string): string {
  return `
ALTER TABLE ${table} ENABLE ROW LEVEL SECURITY;
ALTER TABLE ${table} FORCE ROW LEVEL SECURITY;
CREATE POLICY of_the_shop ON ${table} USING (shop_id = ${CURRENT_SHOP}) WITH CHECK (shop_id = ${CURRENT_SHOP});`;
}
