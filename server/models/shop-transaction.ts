import { Transaction, type Sequelize } from 'sequelize';

export interface InShopOptions {
  isolationLevel?: Transaction.ISOLATION_LEVELS;
  readOnly?: boolean;
}

// Sequelize calls these but leaves them out of its types
interface Started {
  prepareEnvironment(useCls: boolean): Promise<void>;
}

/** Begins, and says of which shop it is, in one round trip. */
class ShopTransaction extends Transaction {
  private readonly shopId: string;
  private readonly modes: string;

  constructor(sequelize: Sequelize, shopId: string, { isolationLevel, readOnly = false }: InShopOptions) {
    super(sequelize, {});
    this.shopId = shopId;
    const level = isolationLevel ? [`ISOLATION LEVEL ${isolationLevel}`] : [];
    this.modes = [...level, ...(readOnly ? ['READ ONLY'] : [])].join(', ');
  }

  async begin(): Promise<void> {
    const { sequelize } = this as unknown as { sequelize: Sequelize };
    await sequelize.query(`START TRANSACTION ${this.modes}; ${setShop(sequelize, this.shopId)}`, { transaction: this });
  }
}

/** Runs `work` in one transaction that sees and writes the rows of one shop only. */
export async function runInShop<T>(
  sequelize: Sequelize,
  shopId: string,
  work: (transaction: Transaction) => Promise<T>,
  options: InShopOptions = {},
): Promise<T> {
  const transaction = new ShopTransaction(sequelize, shopId, options);
  await (transaction as unknown as Started).prepareEnvironment(false);
  let result: T;
  try {
    result = await work(transaction);
  } catch (error) {
    // what went wrong first is what matters; a broken connection is ended by Sequelize
    await transaction.rollback().catch(() => {});
    throw error;
  }
  await transaction.commit();
  return result;
}

/** Rows of one shop by one statement, with `values` as :name, in one round trip. */
export async function readInShop<Row>(
  sequelize: Sequelize,
  shopId: string,
  sql: string,
  values: Record<string, string>,
): Promise<Row[]> {
  // statements that are sent together are one transaction: what is set local to it ends with it, whether or not it fails
  const [rows] = await sequelize.query(`${setShop(sequelize, shopId)}; ${sql}`, { replacements: values });
  return rows as Row[];
}

// read by the policies of row security; a SET returns no rows among those that are asked for
function setShop(sequelize: Sequelize, shopId: string): string {
  return `SET LOCAL ribband.shop_id = ${sequelize.escape(shopId)}`;
}
