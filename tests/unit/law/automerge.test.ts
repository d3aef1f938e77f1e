import * as Automerge from '@automerge/automerge';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { HOURS_PREFIX, liveStatements } from '#shared/sync/fields.ts';
import { ShopInMemory, TODAY, type Phone } from '#tests/worlds/shop-in-memory.ts';

// Goal: the live values of a field are those of a multi-value register (law 5).
// Method: the same history is lived through by phones and by Automerge documents, one a device and one for the server,
// which merge at the same moments; after every exchange, what each phone shows has the conflicts that its document has.

const HISTORIES = 600;
const DEVICES = 4;
const SEED = 20260602;

type Doc = Automerge.Doc<Record<string, number>>;
type Act = 'amend' | 'strike' | 'restore' | 'send' | 'hear';
interface Step {
  device: number;
  act: Act;
  fields: number[];
}

const MADE = 0;

class Twins {
  readonly shop: ShopInMemory;
  readonly phones: Phone[] = [];
  docs: Doc[] = [];
  server: Doc;
  readonly opIds: string[] = [];
  readonly entryId: string;
  readonly fields: string[];
  private readonly sets: ((said: number) => object)[];
  conflicts = 0;

  private constructor(shop: ShopInMemory, boatId: string, stageIds: string[]) {
    this.shop = shop;
    this.entryId = shop.newId();
    const people = Array.from({ length: DEVICES }, (_, index) =>
      this.shop.person(`Person ${index}`, 'foreman'),
    );
    const [rosa, ida] = [people[0]!, people[1]!];
    const hours = (personId: string) => (said: number) => ({ hours: [{ personId, minutes: said }] });
    this.fields = ['text', 'workDate', 'place', 'stageId', HOURS_PREFIX + rosa, HOURS_PREFIX + ida, 'struck'];
    this.sets = [
      (said) => ({ text: `words ${said}` }),
      (said) => ({ workDate: `2026-05-${String(1 + (said % 30)).padStart(2, '0')}` }),
      (said) => ({ place: { number: said } }),
      (said) => ({ boatId, stageId: stageIds[said % 2] }),
      hours(rosa),
      hours(ida),
    ];
    this.phones.push(...people.map((person) => this.shop.phone(person)));
    // the making op gives no place, no hours of the second person's, and strikes nothing
    const made = this.fields.filter((field) => ![this.fields[2], this.fields[5], 'struck'].includes(field));
    this.server = Automerge.from(Object.fromEntries(made.map((field) => [field, MADE])));
  }

  static async begin(): Promise<Twins> {
    const shop = new ShopInMemory();
    const { boatId, stageId, laterStageId } = await shop.withBoat();
    const twins = new Twins(shop, boatId, [stageId, laterStageId]);
    const { entryId } = twins;
    const maker = twins.phones[0]!;
    const hours = [{ personId: maker.personIds[0]!, minutes: 30 }];
    const op = maker.does('entry.write', {
      entryId,
      boatId,
      stageId,
      workDate: TODAY,
      text: 'words',
      spoken: false,
      hours,
    });
    twins.opIds.push(op.id);
    await maker.sends();
    for (const phone of twins.phones) phone.hears();
    twins.docs = twins.phones.map(() => Automerge.clone(twins.server));
    return twins;
  }

  async live({ device, act, fields }: Step): Promise<void> {
    const phone = this.phones[device]!;
    if (act === 'send') {
      await phone.sends();
      this.server = Automerge.merge(this.server, this.docs[device]!);
    }
    if (act === 'send' || act === 'hear') {
      phone.hears();
      this.docs[device] = Automerge.merge(this.docs[device]!, this.server);
    } else
      this.says(
        device,
        act,
        act === 'amend' ? [...new Set(fields.map((field) => field % this.sets.length))] : [],
      );
    this.agree(device);
  }

  private says(device: number, act: Act, fields: number[]): void {
    const said = this.opIds.length;
    const { entryId } = this;
    const hours = fields.flatMap((field) =>
      'hours' in this.sets[field]!(said) ? (this.sets[field]!(said) as { hours: object[] }).hours : [],
    );
    const set = Object.assign(
      {},
      ...fields.map((field) => this.sets[field]!(said)),
      hours.length > 0 ? { hours } : {},
    ) as object;
    const op = this.phones[device]!.does(
      `entry.${act}`,
      act === 'amend' ? { entryId, set } : { entryId, why: 'so' },
    );
    this.opIds.push(op.id);
    this.docs[device] = Automerge.change(this.docs[device]!, (doc) => {
      for (const field of act === 'amend' ? fields.map((index) => this.fields[index]!) : ['struck'])
        doc[field] = said;
    });
  }

  private agree(device: number): void {
    const row = this.phones[device]!.sees('entry', this.entryId)!;
    for (const field of this.fields) {
      const live = liveStatements(row, field).map(({ opId }) => this.opIds.indexOf(opId));
      const conflicts = valuesOf(this.docs[device]!, field);
      if (conflicts.length > 1) this.conflicts += 1;
      expect(live.sort(byNumber), field).toEqual(conflicts.sort(byNumber));
    }
  }
}

function byNumber(a: number, b: number): number {
  return a - b;
}

function valuesOf(doc: Doc, field: string): number[] {
  const conflicts = Automerge.getConflicts(doc, field);
  if (conflicts) return Object.values(conflicts) as number[];
  return field in doc ? [doc[field]!] : [];
}

const ACTS: { weight: number; arbitrary: fc.Arbitrary<Act> }[] = [
  { weight: 6, arbitrary: fc.constant('amend') },
  { weight: 1, arbitrary: fc.constant('strike') },
  { weight: 1, arbitrary: fc.constant('restore') },
  { weight: 3, arbitrary: fc.constant('send') },
  { weight: 2, arbitrary: fc.constant('hear') },
];

const step = fc.record({
  device: fc.nat(DEVICES - 1),
  act: fc.oneof(...ACTS),
  fields: fc.array(fc.nat(5), { minLength: 1, maxLength: 3 }),
});

describe('the live values of every field', () => {
  it('are those of a multi-value register with the same history', async () => {
    let conflicts = 0;
    await fc.assert(
      fc.asyncProperty(fc.array(step, { minLength: 5, maxLength: 40, size: 'max' }), async (steps) => {
        const twins = await Twins.begin();
        for (const one of steps) await twins.live(one);
        for (let device = 0; device < DEVICES; device += 1)
          await twins.live({ device, act: 'send', fields: [] });
        conflicts += twins.conflicts;
      }),
      { numRuns: HISTORIES, seed: SEED },
    );
    expect(conflicts).toBeGreaterThan(5 * HISTORIES);
  }, 400_000);
});
