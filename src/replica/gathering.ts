import type { FeedRow, SyncAnswer } from '#shared/sync/protocol.ts';
import type { Row } from '#shared/sync/row.ts';
import type { Stamp } from '#shared/sync/stamp.ts';
import type { Pulled } from './person-store.ts';

/** The pages of a pull, gathered until there are no more: rows are shown together or not at all. */
export class Gathering {
  readonly rows = new Map<string, { entity: string; row: ({ id: string } & object) | null }>();
  readonly stamps = new Set<Stamp>();
  cursor: string | null;
  isAll: boolean;
  isReplayAsked = false;

  constructor(cursor: string | null) {
    this.cursor = cursor;
    this.isAll = cursor === null;
  }

  add({
    rows,
    cursor,
    reset,
    replayFrom,
  }: Pick<SyncAnswer, 'rows' | 'cursor' | 'reset' | 'replayFrom'>): void {
    if (reset) {
      this.rows.clear();
      this.isAll = true;
    }
    this.isReplayAsked ||= replayFrom !== null;
    this.cursor = cursor;
    for (const row of rows) this.addRow(row);
  }

  private addRow({ entity, id, row, gone }: FeedRow): void {
    // derived from rows here, with the same ids
    if (entity === 'looseEnd') return;
    const key = `${entity}/${id}`;
    if (gone || !row) {
      this.rows.set(key, { entity, row: null });
      return;
    }
    this.rows.set(key, { entity, row: { ...row, id } });
    const { stamps } = row as unknown as Partial<Row>;
    for (const stamp of Object.values(stamps ?? {})) this.stamps.add(stamp);
  }

  pulled(heardAt: string, pullsBefore: number): Pulled {
    if (this.cursor === null) throw new Error('Nothing has been gathered yet.');
    return { rows: this.rows, isAll: this.isAll, cursor: this.cursor, heardAt, pullsBefore };
  }
}
