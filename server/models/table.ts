import { DataTypes, type Model, type ModelStatic } from 'sequelize';

/** A table's model; `Optional` are the columns that need not be given to make a line of it. */
export type Table<Columns extends object, Defaulted extends keyof Columns = never> = ModelStatic<
  Model<Columns, Omit<Columns, Defaulted> & Partial<Pick<Columns, Defaulted>>> & Columns
>;

/** The key of what belongs to a shop. */
export const SHOP_KEY = {
  shopId: { type: DataTypes.UUID, primaryKey: true },
  id: { type: DataTypes.UUID, primaryKey: true },
};

/** The columns of what has a place in a shop's feed. */
export interface FeedColumns {
  shopId: string;
  id: string;
  seq: number;
}

export const FEED = { ...SHOP_KEY, seq: { type: DataTypes.BIGINT, allowNull: false } };
