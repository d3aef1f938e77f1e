import type { Transaction } from 'sequelize';
import { query } from './query.ts';

/** Runs `work` so that its failing undoes what it did and no more: rejects with what it threw, and the transaction goes on. */
export async function underSavepoint<T>(transaction: Transaction, work: () => Promise<T>): Promise<T> {
  await query(transaction, 'SAVEPOINT before_it');
  try {
    const result = await work();
    await query(transaction, 'RELEASE SAVEPOINT before_it');
    return result;
  } catch (error) {
    await query(transaction, 'ROLLBACK TO SAVEPOINT before_it; RELEASE SAVEPOINT before_it');
    throw error;
  }
}
