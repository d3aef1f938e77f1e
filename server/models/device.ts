import { DataTypes, type Sequelize } from 'sequelize';
import type { DeviceRow, Held } from '#shared/identity/device.ts';
import { FEED, SHOP_KEY, type FeedColumns, type Table } from './table.ts';

export interface DeviceColumns extends FeedColumns {
  label: string;
  /** the device in whose place this one came */
  replaces: string | null;
  /** who used it last */
  personId: string | null;
  lastHeardAt: Date | null;
  appVersion: string | null;
  /** what it had not sent when it was last heard */
  held: Held | null;
  /** the stamp of its last op */
  lastOrderedAt: string | null;
  revokedAt: Date | null;
  row: DeviceRow;
}

export type DeviceTable = Table<
  DeviceColumns,
  'replaces' | 'personId' | 'lastHeardAt' | 'appVersion' | 'held' | 'lastOrderedAt' | 'revokedAt'
>;

export function deviceTable(sequelize: Sequelize): DeviceTable {
  return sequelize.define(
    'Device',
    {
      ...FEED,
      label: DataTypes.TEXT,
      replaces: DataTypes.UUID,
      personId: DataTypes.UUID,
      lastHeardAt: DataTypes.DATE,
      appVersion: DataTypes.TEXT,
      held: DataTypes.JSON,
      lastOrderedAt: DataTypes.TEXT,
      revokedAt: DataTypes.DATE,
      row: DataTypes.JSON,
    },
    { tableName: 'devices' },
  ) as unknown as DeviceTable;
}

/** Who is enrolled on a device: has signed in on it with the password. */
export interface DevicePersonColumns {
  shopId: string;
  deviceId: string;
  personId: string;
}

export type DevicePersonTable = Table<DevicePersonColumns>;

export function devicePersonTable(sequelize: Sequelize): DevicePersonTable {
  return sequelize.define(
    'DevicePerson',
    {
      shopId: { type: DataTypes.UUID, primaryKey: true },
      deviceId: { type: DataTypes.UUID, primaryKey: true },
      personId: { type: DataTypes.UUID, primaryKey: true },
    },
    { tableName: 'device_people' },
  ) as unknown as DevicePersonTable;
}

/** What one sign-in began: a line of refresh tokens, each the successor of the one before. */
export interface RefreshFamilyColumns {
  shopId: string;
  id: string;
  deviceId: string;
  personId: string;
  /** the highest number presented so far */
  used: number;
  endedAt: Date | null;
  lastUsedAt: Date;
}

export type RefreshFamilyTable = Table<RefreshFamilyColumns, 'used' | 'endedAt'>;

export function refreshFamilyTable(sequelize: Sequelize): RefreshFamilyTable {
  return sequelize.define(
    'RefreshFamily',
    {
      ...SHOP_KEY,
      deviceId: DataTypes.UUID,
      personId: DataTypes.UUID,
      used: { type: DataTypes.INTEGER, defaultValue: 0 },
      endedAt: DataTypes.DATE,
      lastUsedAt: DataTypes.DATE,
    },
    { tableName: 'refresh_families' },
  ) as unknown as RefreshFamilyTable;
}
