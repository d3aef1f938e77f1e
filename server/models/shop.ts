import { DataTypes, type Sequelize } from 'sequelize';
import type { ShopRow } from '#shared/identity/shop.ts';
import type { Table } from './table.ts';

export interface ShopColumns {
  shopId: string;
  /** the last number given in the shop's feed */
  seq: number;
  /** the number of the shop's own row */
  rowSeq: number;
  name: string;
  timeZone: string;
  currency: string;
  units: string;
  incarnation: string;
  row: ShopRow;
}

export type ShopTable = Table<ShopColumns, 'seq' | 'rowSeq' | 'incarnation'>;

export function shopTable(sequelize: Sequelize): ShopTable {
  return sequelize.define(
    'Shop',
    {
      shopId: { type: DataTypes.UUID, primaryKey: true },
      seq: DataTypes.BIGINT,
      rowSeq: DataTypes.BIGINT,
      name: DataTypes.TEXT,
      timeZone: DataTypes.TEXT,
      currency: DataTypes.TEXT,
      units: DataTypes.TEXT,
      incarnation: DataTypes.UUID,
      row: DataTypes.JSON,
    },
    { tableName: 'shops' },
  ) as unknown as ShopTable;
}

export interface InstallationColumns {
  onlyOne: boolean;
  jwtSecret: string;
  firstRunCodeHash: string | null;
}

export type InstallationTable = Table<InstallationColumns>;

export function installationTable(sequelize: Sequelize): InstallationTable {
  return sequelize.define(
    'Installation',
    {
      onlyOne: { type: DataTypes.BOOLEAN, primaryKey: true },
      jwtSecret: DataTypes.TEXT,
      firstRunCodeHash: DataTypes.TEXT,
    },
    { tableName: 'installation' },
  ) as unknown as InstallationTable;
}

export interface KnownShopColumns {
  shopId: string;
  createdAt: Date;
}

export type KnownShopTable = Table<KnownShopColumns, 'createdAt'>;

export function knownShopTable(sequelize: Sequelize): KnownShopTable {
  return sequelize.define(
    'KnownShop',
    {
      shopId: { type: DataTypes.UUID, primaryKey: true },
      createdAt: DataTypes.DATE,
    },
    { tableName: 'known_shops' },
  ) as unknown as KnownShopTable;
}
