import type { Sequelize, Transaction } from 'sequelize';

/** Runs SQL within the transaction, with `values` as $1, $2 ..., and returns the rows that it gives. */
export async function query<Row>(
  transaction: Transaction,
  sql: string,
  values: unknown[] = [],
): Promise<Row[]> {
  // Sequelize keeps it on the transaction but leaves it out of its types
  const { sequelize } = transaction as Transaction & { sequelize: Sequelize };
  const [rows] = await sequelize.query(sql, { bind: values, transaction });
  return rows as Row[];
}
