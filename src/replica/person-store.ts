import { get, promisifyRequest, set } from 'idb-keyval';
import { z } from 'zod';
import { refKey, type Entity } from '#shared/sync/row.ts';
import { PICTURE_STORES, PictureStore } from './photos/picture-store.ts';
import { isReadableRow, readStoredRow } from './readable-row.ts';
import type { Seal } from './seal.ts';
import { by, openRecord, openRecords } from './sealed-records.ts';
import { KeptDatabase } from './store.ts';
import { BROKEN_STORE } from './stored-records.ts';
import { Turns } from './turns.ts';
import type { Rows } from './view.ts';
import type { World } from './world.ts';

const heardSchema = z.object({ cursor: z.string(), heardAt: z.iso.datetime() });
const rememberedSchema = z.object({ boatId: z.string().nullable(), stageId: z.string().nullable() });

/** Where a person was last; null where nothing is remembered. */
export type Remembered = z.infer<typeof rememberedSchema>;

/** What a pull has brought: the latest state of each row, `row` null where it is gone. */
export interface Pulled {
  rows: ReadonlyMap<string, { entity: string; row: ({ id: string } & object) | null }>;
  /** these rows are all there is, in place of what was there */
  isAll: boolean;
  cursor: string;
  heardAt: string;
  /** the store's count when the pull began */
  pullsBefore: number;
}

/** What the device keeps for a person: rows, how far they are heard, drafts, pictures, and where the person was last. All of it sealed. */
export class PersonStore {
  readonly personId: string;
  readonly pictures: PictureStore;
  rows: Rows = new Map();
  cursor: string | null = null;
  heardAt: string | null = null;
  remembered: Remembered = { boatId: null, stageId: null };
  drafts: ReadonlyMap<string, unknown> = new Map();
  /** counts the pulls, so that two tabs notice each other's */
  pulls = 0;
  private readonly database: KeptDatabase;
  private readonly seal: Seal;
  private readonly turns = new Turns();

  private constructor(world: World, seal: Seal, personId: string) {
    this.personId = personId;
    this.seal = seal;
    this.database = new KeptDatabase({
      indexedDB: world.indexedDB,
      name: `ribband-person-${personId}`,
      stores: ['rows', 'about', 'drafts', ...PICTURE_STORES, BROKEN_STORE],
      onBlocked: world.onBlocked,
    });
    this.pictures = new PictureStore(this.sealed);
  }

  private get sealed() {
    return { database: this.database, seal: this.seal };
  }

  static async open(world: World, seal: Seal, personId: string): Promise<PersonStore> {
    const store = new PersonStore(world, seal, personId);
    await Promise.all([store.turns.take(() => store.readAll()), store.readDrafts(), store.pictures.read()]);
    return store;
  }

  close(): void {
    this.database.close();
  }

  /** Reads rows again where another tab has pulled. */
  catchUp(): Promise<void> {
    return this.turns.take(async () => {
      if ((await this.readPulls()) !== this.pulls) await this.readAll();
    });
  }

  /** Keeps what was pulled, as one. False, with nothing kept, where another tab has pulled meanwhile. */
  apply(pulled: Pulled): Promise<boolean> {
    return this.turns.take(() => this.write(pulled));
  }

  private async write({ rows, isAll, cursor, heardAt, pullsBefore }: Pulled): Promise<boolean> {
    const sealedHeard = await this.seal.seal({ cursor, heardAt });
    const sealedRows = await Promise.all(
      [...rows].map(
        async ([key, { entity, row }]) => [key, row && (await this.seal.seal({ entity, row }))] as const,
      ),
    );
    const isKept = await this.database.transact(['rows', 'about'], 'readwrite', async (transaction) => {
      const about = transaction.objectStore('about');
      if (readCount(await promisifyRequest<unknown>(about.get('pulls'))) !== pullsBefore) return false;
      const store = transaction.objectStore('rows');
      if (isAll) store.clear();
      for (const [key, sealed] of sealedRows) {
        if (sealed) store.put(sealed, key);
        else store.delete(key);
      }
      about.put(sealedHeard, 'heard');
      about.put(pullsBefore + 1, 'pulls');
      return true;
    });
    if (!isKept) return false;
    Object.assign(this, { cursor, heardAt, pulls: pullsBefore + 1 });
    if (isAll || rows.size > 0) this.rows = this.withPulled(isAll ? [] : this.rows, rows);
    return true;
  }

  private withPulled(
    before: Iterable<[string, { entity: string; row: object }]>,
    pulled: Pulled['rows'],
  ): Rows {
    const next = new Map(before);
    for (const [key, { entity, row }] of pulled) {
      if (row && isReadableRow(entity, row)) next.set(key, { entity, row });
      else next.delete(key);
    }
    return next;
  }

  /** Forgets the rows, and pictures that the server has, as when the person signs out. Drafts stay: nobody else has them. */
  async forgetRows(): Promise<void> {
    await this.pictures.forgetSent();
    return this.turns.take(async () => {
      await this.database.transact(['rows', 'about'], 'readwrite', (transaction) => {
        transaction.objectStore('rows').clear();
        transaction.objectStore('about').delete('heard');
        transaction.objectStore('about').put(this.pulls + 1, 'pulls');
      });
      Object.assign(this, { rows: new Map(), cursor: null, heardAt: null, pulls: this.pulls + 1 });
    });
  }

  /** Keeps a draft; undefined clears it. Resolves once durable. */
  writeDraft(key: string, value: unknown): Promise<void> {
    const drafts = new Map(this.drafts);
    if (value === undefined) drafts.delete(key);
    else drafts.set(key, value);
    this.drafts = drafts;
    return this.turns.take(async () => {
      const sealed = value === undefined ? undefined : await this.seal.seal({ value });
      await this.database.transact(['drafts'], 'readwrite', (transaction) => {
        const store = transaction.objectStore('drafts');
        if (sealed === undefined) store.delete(key);
        else store.put(sealed, key);
      });
    });
  }

  writeRemembered(remembered: Partial<Remembered>): Promise<void> {
    this.remembered = { ...this.remembered, ...remembered };
    const next = this.remembered;
    return this.turns.take(async () =>
      set('remembered', await this.seal.seal(next), this.database.store('about')),
    );
  }

  /** Reads the drafts as they are kept; another tab may have changed them. */
  readDrafts(): Promise<void> {
    return this.turns.take(async () => {
      const { opened } = await openRecords(this.sealed, 'drafts', by(z.object({ value: z.unknown() })));
      this.drafts = new Map(opened.map(([key, { value }]) => [key, value]));
    });
  }

  private async readAll(): Promise<void> {
    // asked for at once, and the count first, so that rows are never older than it says
    const [pulls, { opened, areSomeBroken }, heard, remembered] = await Promise.all([
      this.readPulls(),
      openRecords(this.sealed, 'rows', readStoredRow),
      openRecord(this.sealed, 'about', 'heard', heardSchema),
      openRecord(this.sealed, 'about', 'remembered', rememberedSchema),
    ]);
    this.pulls = pulls;
    // a row that cannot be read is asked for again, with all the others
    this.cursor = areSomeBroken ? null : (heard?.cursor ?? null);
    this.heardAt = heard?.heardAt ?? null;
    if (areSomeBroken) await this.database.store('about')('readwrite', (about) => void about.delete('heard'));
    const rows = new Map<string, { entity: string; row: object }>();
    for (const [, { entity, row }] of opened) {
      if (isReadableRow(entity, row)) rows.set(refKey({ entity: entity as Entity, id: row.id }), { entity, row });
    }
    this.rows = rows;
    this.remembered = remembered ?? this.remembered;
  }

  private async readPulls(): Promise<number> {
    return readCount(await get('pulls', this.database.store('about')));
  }
}

function readCount(stored: unknown): number {
  return typeof stored === 'number' ? stored : 0;
}
