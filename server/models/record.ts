import { DataTypes, type Sequelize } from 'sequelize';
import { FEED, type FeedColumns, type Table } from './table.ts';

/** An op as it came, and what was fixed about it on first receipt. */
export interface OpColumns {
  shopId: string;
  /** the op's id, or the SHA-256 in hex of one that has no usable id */
  opKey: string;
  op: unknown;
  sha256: string;
  deviceId: string;
  personId: string | null;
  kind: string | null;
  receivedAt: Date;
  receivedOn: string;
  orderedAt: string;
  orderedOn: string;
  roles: string[];
  outcome: string;
  reason: string | null;
}

export interface BoatColumns extends FeedColumns {
  name: string;
  row: unknown;
}

export interface StageColumns extends FeedColumns {
  boatId: string;
  row: unknown;
}

export interface TaskColumns extends FeedColumns {
  boatId: string;
  stageId: string | null;
  row: unknown;
}

export interface EntryColumns extends FeedColumns {
  boatId: string;
  stageId: string | null;
  workDate: string;
  authorId: string;
  row: unknown;
}

/** `row` is null once the loose end is closed. */
export interface LooseEndColumns extends FeedColumns {
  entity: string;
  rowId: string;
  boatId: string | null;
  row: unknown;
}

export interface SetAsideColumns extends FeedColumns {
  opKey: string;
  reason: string;
  state: string;
  authorId: string | null;
  awaitsEntity: string | null;
  awaitsId: string | null;
  row: unknown;
}

const JSON_ROW = { row: DataTypes.JSON };

export function opTable(sequelize: Sequelize): Table<OpColumns> {
  return sequelize.define(
    'Op',
    {
      shopId: { type: DataTypes.UUID, primaryKey: true },
      opKey: { type: DataTypes.TEXT, primaryKey: true },
      op: DataTypes.JSON,
      sha256: DataTypes.TEXT,
      deviceId: DataTypes.UUID,
      personId: DataTypes.UUID,
      kind: DataTypes.TEXT,
      receivedAt: DataTypes.DATE,
      receivedOn: DataTypes.DATEONLY,
      orderedAt: DataTypes.TEXT,
      orderedOn: DataTypes.DATEONLY,
      roles: DataTypes.ARRAY(DataTypes.TEXT),
      outcome: DataTypes.TEXT,
      reason: DataTypes.TEXT,
    },
    { tableName: 'ops' },
  ) as unknown as Table<OpColumns>;
}

export function boatTable(sequelize: Sequelize): Table<BoatColumns> {
  const columns = { ...FEED, name: DataTypes.TEXT, ...JSON_ROW };
  return sequelize.define('Boat', columns, { tableName: 'boats' }) as unknown as Table<BoatColumns>;
}

export function stageTable(sequelize: Sequelize): Table<StageColumns> {
  const columns = { ...FEED, boatId: DataTypes.UUID, ...JSON_ROW };
  return sequelize.define('Stage', columns, { tableName: 'stages' }) as unknown as Table<StageColumns>;
}

export function taskTable(sequelize: Sequelize): Table<TaskColumns> {
  const columns = { ...FEED, boatId: DataTypes.UUID, stageId: DataTypes.UUID, ...JSON_ROW };
  return sequelize.define('Task', columns, { tableName: 'tasks' }) as unknown as Table<TaskColumns>;
}

export function entryTable(sequelize: Sequelize): Table<EntryColumns> {
  return sequelize.define(
    'Entry',
    {
      ...FEED,
      boatId: DataTypes.UUID,
      stageId: DataTypes.UUID,
      workDate: DataTypes.DATEONLY,
      authorId: DataTypes.UUID,
      ...JSON_ROW,
    },
    { tableName: 'entries' },
  ) as unknown as Table<EntryColumns>;
}

export function looseEndTable(sequelize: Sequelize): Table<LooseEndColumns> {
  return sequelize.define(
    'LooseEnd',
    {
      ...FEED,
      entity: DataTypes.TEXT,
      rowId: DataTypes.UUID,
      boatId: DataTypes.UUID,
      ...JSON_ROW,
    },
    { tableName: 'loose_ends' },
  ) as unknown as Table<LooseEndColumns>;
}

export function setAsideTable(sequelize: Sequelize): Table<SetAsideColumns> {
  return sequelize.define(
    'SetAside',
    {
      ...FEED,
      opKey: DataTypes.TEXT,
      reason: DataTypes.TEXT,
      state: DataTypes.TEXT,
      authorId: DataTypes.UUID,
      awaitsEntity: DataTypes.TEXT,
      awaitsId: DataTypes.UUID,
      ...JSON_ROW,
    },
    { tableName: 'set_asides' },
  ) as unknown as Table<SetAsideColumns>;
}
