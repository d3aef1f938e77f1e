import { DataTypes, type Sequelize } from 'sequelize';
import type { PersonRow } from '#shared/identity/person.ts';
import type { Role } from '#shared/identity/role.ts';
import { FEED, type FeedColumns, type Table } from './table.ts';

export interface PersonColumns extends FeedColumns {
  name: string;
  /** in lower case */
  email: string;
  passwordHash: string;
  roles: Role[];
  leftAt: Date | null;
  /** goes up when the person's roles or boats change, so that a cursor made before it begins anew */
  feedEpoch: number;
  row: PersonRow;
}

export type PersonTable = Table<PersonColumns, 'leftAt' | 'feedEpoch'>;

export function personTable(sequelize: Sequelize): PersonTable {
  return sequelize.define(
    'Person',
    {
      ...FEED,
      name: DataTypes.TEXT,
      email: DataTypes.TEXT,
      passwordHash: DataTypes.TEXT,
      roles: DataTypes.ARRAY(DataTypes.TEXT),
      leftAt: DataTypes.DATE,
      feedEpoch: { type: DataTypes.INTEGER, defaultValue: 0 },
      row: DataTypes.JSON,
    },
    { tableName: 'people' },
  ) as unknown as PersonTable;
}

export interface BoatOwnerColumns {
  shopId: string;
  boatId: string;
  personId: string;
}

export type BoatOwnerTable = Table<BoatOwnerColumns>;

export function boatOwnerTable(sequelize: Sequelize): BoatOwnerTable {
  return sequelize.define(
    'BoatOwner',
    {
      shopId: { type: DataTypes.UUID, primaryKey: true },
      boatId: { type: DataTypes.UUID, primaryKey: true },
      personId: { type: DataTypes.UUID, primaryKey: true },
    },
    { tableName: 'boat_owners' },
  ) as unknown as BoatOwnerTable;
}
