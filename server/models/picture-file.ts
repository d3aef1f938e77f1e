import { DataTypes, type Sequelize } from 'sequelize';
import type { Table } from './table.ts';

/** What has come of the bytes of a photo or recording; nothing of it where only the other of thumbnail and whole has come. */
export interface PictureFileColumns {
  shopId: string;
  kind: 'photo' | 'recording';
  sha256: string;
  bytes: number | null;
  mediaType: string | null;
  width: number | null;
  height: number | null;
  fullAt: Date | null;
  /** the person who sent it */
  fullBy: string | null;
  thumbBytes: number | null;
  thumbType: string | null;
  thumbAt: Date | null;
  thumbBy: string | null;
}

export type PictureFileTable = Table<PictureFileColumns>;

export function pictureFileTable(sequelize: Sequelize): PictureFileTable {
  return sequelize.define(
    'PictureFile',
    {
      shopId: { type: DataTypes.UUID, primaryKey: true },
      kind: { type: DataTypes.TEXT, primaryKey: true },
      sha256: { type: DataTypes.TEXT, primaryKey: true },
      bytes: DataTypes.INTEGER,
      mediaType: DataTypes.TEXT,
      width: DataTypes.INTEGER,
      height: DataTypes.INTEGER,
      fullAt: DataTypes.DATE,
      fullBy: DataTypes.UUID,
      thumbBytes: DataTypes.INTEGER,
      thumbType: DataTypes.TEXT,
      thumbAt: DataTypes.DATE,
      thumbBy: DataTypes.UUID,
    },
    { tableName: 'picture_files' },
  ) as unknown as PictureFileTable;
}
