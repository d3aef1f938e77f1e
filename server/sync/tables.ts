import type { RecordEntity } from '#shared/sync/row.ts';

/** Where an entity's rows are kept: the table and, beside id, seq and row, the columns that keys and joins need. */
export interface RowTable {
  table: string;
  columns: Record<string, 'uuid' | 'text' | 'date'>;
  /** the values of those columns, from a row */
  values(row: Record<string, unknown>): Record<string, unknown>;
}

const PLACED_COLUMNS = { boat_id: 'uuid', stage_id: 'uuid', entry_id: 'uuid' } as const;

function placedValues({ boatId, stageId, entryId }: Record<string, unknown>): Record<string, unknown> {
  return { boat_id: boatId, stage_id: stageId, entry_id: entryId };
}

/** In the order in which their rows refer to one another. */
export const ROW_TABLES: Record<RecordEntity, RowTable> = {
  boat: {
    table: 'boats',
    columns: { name: 'text' },
    values: ({ name }) => ({ name }),
  },
  stage: {
    table: 'stages',
    columns: { boat_id: 'uuid' },
    values: ({ boatId }) => ({ boat_id: boatId }),
  },
  task: {
    table: 'tasks',
    columns: { boat_id: 'uuid', stage_id: 'uuid' },
    values: ({ boatId, stageId }) => ({ boat_id: boatId, stage_id: stageId }),
  },
  entry: {
    table: 'entries',
    columns: { boat_id: 'uuid', stage_id: 'uuid', work_date: 'date', author_id: 'uuid' },
    values: ({ boatId, stageId, workDate, authorId }) => ({
      boat_id: boatId,
      stage_id: stageId,
      work_date: workDate,
      author_id: authorId,
    }),
  },
  finding: { table: 'findings', columns: PLACED_COLUMNS, values: placedValues },
  sound: { table: 'sounds', columns: PLACED_COLUMNS, values: placedValues },
  photo: {
    table: 'photos',
    columns: { ...PLACED_COLUMNS, finding_id: 'uuid', sha256: 'text', author_id: 'uuid' },
    values: (row) => ({ ...placedValues(row), finding_id: row.findingId, sha256: row.sha256, author_id: row.authorId }),
  },
  setAside: {
    table: 'set_asides',
    columns: { op_key: 'text', reason: 'text', state: 'text', author_id: 'uuid', awaits_entity: 'text', awaits_id: 'uuid' },
    values: ({ opKey, reason, state, authorId, awaits }) => {
      const { entity, id } = (awaits ?? {}) as { entity?: string; id?: string };
      return { op_key: opKey, reason, state, author_id: authorId, awaits_entity: entity, awaits_id: id };
    },
  },
};

export const LOOSE_END_TABLE: RowTable = {
  table: 'loose_ends',
  columns: { entity: 'text', row_id: 'uuid', boat_id: 'uuid' },
  values: ({ entity, rowId, boatId }) => ({ entity, row_id: rowId, boat_id: boatId }),
};
