import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { BoatRow } from '#shared/boat/boat.ts';
import { OPS_PER_REQUEST_MAX } from '#shared/sync/protocol.ts';
import { opKinds } from '#shared/sync/registry.ts';
import { TEMPLATE_IDS, loadTemplate, type Template } from '#shared/trade/load.ts';
import { orderOfWork, questionsOf, type BoatToWorkOn, type WorkOp } from '#shared/trade/order-of-work.ts';
import { inOrder } from '#shared/trade/stage-order.ts';
import { choiceSchema, type TaskTemplate } from '#shared/trade/template.ts';
import { ShopInMemory } from '#tests/worlds/shop-in-memory.ts';

// Any boat, of any template: what is counted, what was chosen. The numbers are looked up in the template's file
// again here, by the words of `per`, and not by the code that makes the tasks.
const templates = new Map<string, Template>();
for (const id of TEMPLATE_IDS) templates.set(id, await loadTemplate(id));

const side = fc.constantFrom('port' as const, 'starboard' as const);
const number = fc.integer({ min: 0, max: 9999 });
const numbered = fc.array(fc.record({ number, side }, { requiredKeys: [] }), { maxLength: 30 });
const words = fc.string({ maxLength: 500 }).filter((text) => !text.includes('\u0000'));
const places = fc.array(fc.record({ words, number, side }, { requiredKeys: [] }), { maxLength: 6 });
const placeTaskIds = [...templates.values()].flatMap((template) =>
  questionsOf(template).places.map(({ id }) => id),
);
const counts = fc.record(
  {
    ribs: numbered,
    planks: numbered,
    lengthMm: fc.integer({ min: 0, max: 1_000_000 }),
    places: fc.dictionary(fc.constantFrom(...placeTaskIds), places),
  },
  { requiredKeys: [] },
);
const boats = fc.record({
  template: fc.constantFrom(...templates.values()),
  counts,
  chosen: fc.subarray([...choiceSchema.options]),
});

const BOAT_ID = '019e8000-0000-7000-8000-00000000b0a7';

function idsFrom(start: number) {
  let given = start;
  return () => `019e8000-0000-7000-8000-${(given += 1).toString(16).padStart(12, '0')}`;
}

function workOf(template: Template, boat: Omit<BoatToWorkOn, 'boatId'>) {
  const ops = orderOfWork(template, { boatId: BOAT_ID, ...boat }, idsFrom(1_000_000));
  const stages = ops.flatMap((op) => (op.kind === 'stage.add' ? [op.data] : []));
  const tasks = ops.flatMap((op) => (op.kind === 'task.add' ? [op.data] : []));
  return { ops, stages, tasks };
}

type Boat = Omit<BoatToWorkOn, 'boatId'>;

/** The tasks of the template that belong on the boat's list, by what was chosen. */
function wanted(template: Template, { chosen = [] }: Boat) {
  const isIn = ({ choice }: { choice?: (typeof chosen)[number] | undefined }) =>
    !choice || chosen.includes(choice);
  return template.stages
    .filter(isIn)
    .flatMap((stage) => stage.tasks.filter(isIn).map((task) => ({ stage, task })));
}

function timesOf(task: TaskTemplate, { counts = {} }: Boat): number {
  if (task.per === 'side') return 2;
  if (task.per === 'rib') return counts.ribs?.length ?? 0;
  if (task.per === 'plank') return counts.planks?.length ?? 0;
  if (task.per === 'place' || task.per === 'finding') return counts.places?.[task.id]?.length ?? 0;
  return 1;
}

function minutesOf(task: TaskTemplate, boat: Boat): number {
  if (task.per === 'tenFeet')
    return Math.round(task.estimateMinutes * ((boat.counts?.lengthMm ?? 0) / 304.8 / 10));
  return timesOf(task, boat) * task.estimateMinutes;
}

const sum = (numbers: number[]) => numbers.reduce((total, each) => total + each, 0);

describe('from a template to a boat', () => {
  test('there are as many of each task as its `per` says', () => {
    fc.assert(
      fc.property(boats, ({ template, ...boat }) => {
        const { tasks } = workOf(template, boat);
        const made = (task: TaskTemplate) =>
          tasks.filter(({ templateId }) => templateId === `${template.id}/${task.id}`);
        for (const { task } of wanted(template, boat)) expect(made(task)).toHaveLength(timesOf(task, boat));
        expect(tasks).toHaveLength(sum(wanted(template, boat).map(({ task }) => timesOf(task, boat))));
      }),
    );
  });

  test('every task belongs to the stage that the template gives it, and every id is new', () => {
    fc.assert(
      fc.property(boats, ({ template, ...boat }) => {
        const { stages, tasks } = workOf(template, boat);
        const stageOf = new Map(
          wanted(template, boat).map(({ stage, task }) => [
            `${template.id}/${task.id}`,
            `${template.id}/${stage.id}`,
          ]),
        );
        for (const task of tasks) {
          const stage = stages.find(({ stageId }) => stageId === task.stageId);
          expect(stage?.templateId).toBe(stageOf.get(task.templateId!));
          expect([task.boatId, stage?.boatId]).toEqual([BOAT_ID, BOAT_ID]);
        }
        const ids = [...stages.map(({ stageId }) => stageId), ...tasks.map(({ taskId }) => taskId)];
        expect(new Set(ids).size).toBe(ids.length);
      }),
    );
  });

  test('a stage comes after stages that were added before it, so that no circle is', () => {
    fc.assert(
      fc.property(boats, ({ template, ...boat }) => {
        const added = new Set<string>();
        const { stages } = workOf(template, boat);
        for (const { stageId, after } of stages) {
          for (const before of after) expect(added).toContain(before);
          added.add(stageId);
        }
        expect(stages.map(({ order }) => order)).toEqual(stages.map((_, index) => index + 1));
      }),
    );
  });

  test('a stage still waits for all that it waited for through one that is left out', () => {
    fc.assert(
      fc.property(boats, ({ template, ...boat }) => {
        const { stages } = workOf(template, boat);
        const byName = new Map(stages.map((stage) => [stage.templateId!.split('/')[1]!, stage]));
        const kept = reached(
          [...byName].map(([id, { after }]) => [id, after.map((stageId) => idOf(stages, stageId))]),
        );
        const whole = reached(template.stages.map(({ id, after }) => [id, after]));
        for (const id of byName.keys()) {
          expect(kept.get(id)).toEqual(new Set([...whole.get(id)!].filter((before) => byName.has(before))));
        }
      }),
    );
  });

  test('the hours of a stage are its tasks hours times what was counted', () => {
    fc.assert(
      fc.property(boats, ({ template, ...boat }) => {
        const { stages, tasks } = workOf(template, boat);
        for (const stage of stages) {
          const own = wanted(template, boat).filter(
            ({ stage: { id } }) => `${template.id}/${id}` === stage.templateId,
          );
          const made = tasks
            .filter(({ stageId }) => stageId === stage.stageId)
            .map((task) => task.estimateMinutes ?? 0);
          expect(sum(made)).toBe(sum(own.map(({ task }) => minutesOf(task, boat))));
        }
      }),
    );
  });

  test('every op is one that the record understands', () => {
    fc.assert(
      fc.property(boats, ({ template, ...boat }) => {
        for (const { kind, data } of workOf(template, boat).ops) {
          expect(opKinds.get(kind)!.data.safeParse(data).error?.issues ?? []).toEqual([]);
        }
      }),
    );
  });

  test('an op names only what came before it', () => {
    fc.assert(
      fc.property(boats, ({ template, ...boat }) => {
        const there = new Set([BOAT_ID]);
        for (const { kind, data } of workOf(template, boat).ops) {
          const opKind = opKinds.get(kind)!;
          for (const { id } of opKind.names!(data)) expect(there).toContain(id);
          there.add(opKind.rowId(data));
        }
      }),
    );
  });

  test('the merge keeps all of it, in one batch', async () => {
    await fc.assert(
      fc.asyncProperty(boats, async ({ template, ...boat }) => {
        const shop = new ShopInMemory();
        const desk = shop.phone(shop.person('Maud', 'foreman'));
        desk.does('boat.add', { boatId: BOAT_ID, name: 'Petrel', templateId: template.id });
        const { ops } = workOf(template, boat);
        for (const { kind, data } of ops) desk.does(kind, data);
        const outcomes = await desk.sends();
        expect(outcomes.filter(({ outcome }) => outcome !== 'kept')).toEqual([]);
        expect(outcomes).toHaveLength(ops.length + 1);
        expect(shop.all('setAside')).toEqual([]);
        expect(shop.looseEnds()).toEqual([]);
        expect((shop.row('boat', BOAT_ID) as BoatRow).templateId).toBe(template.id);
        expect(shop.all('task')).toHaveLength(ops.filter(({ kind }) => kind === 'task.add').length);
      }),
      { numRuns: 15 },
    );
  });
});

test('what comes after a stage that is left out comes after what that one came after', () => {
  const [first, second] = templates.get('annual_refit')!.stages;
  const leftOut = { ...second!, id: 'left_out', after: [first!.id], choice: 'bleach' as const };
  const last = { ...second!, id: 'last', after: ['left_out'] };
  const template = { ...templates.get('annual_refit')!, stages: [first!, leftOut, last] };
  const { stages } = workOf(template, {});
  expect(stages.map(({ after }) => after)).toEqual([[], [stages[0]!.stageId]]);
});

describe('a varnished boat', () => {
  const template = templates.get('varnished_planked')!;
  const titles = (ops: WorkOp[]) => ops.flatMap((op) => (op.kind === 'task.add' ? [op.data.title] : []));

  test('is given nothing that was not chosen', () => {
    const { stages, tasks } = workOf(template, {});
    const names = stages.map(({ name }) => name);
    expect(names).not.toContain('Bottom planking off');
    expect(names).not.toContain('Bleach and neutralise (if stain is left)');
    expect([stages.length, tasks.length]).toEqual([17, 109]);
  });

  test('with all chosen it is twenty stages in one request', () => {
    const { ops, stages, tasks } = workOf(template, { chosen: choiceSchema.options });
    expect([stages.length, tasks.length]).toEqual([20, 129]);
    expect(ops.length).toBeLessThan(OPS_PER_REQUEST_MAX);
  });

  test('without bleach, stain comes straight after fairing', () => {
    const { stages } = workOf(template, {});
    const stage = (id: string) => stages.find(({ templateId }) => templateId === `varnished_planked/${id}`)!;
    expect(stage('stain').after).toEqual([stage('fair').stageId]);
  });

  test('has both sides of what is done by the side, each in its place', () => {
    const { tasks } = workOf(template, {});
    const strips = tasks.filter(
      ({ templateId }) => templateId === 'varnished_planked/strip_topsides_one_side',
    );
    expect(strips.map(({ title, place, estimateMinutes }) => ({ title, place, estimateMinutes }))).toEqual([
      { title: 'Strip topsides, port', place: { partId: 'topsides', side: 'port' }, estimateMinutes: 1080 },
      {
        title: 'Strip topsides, starboard',
        place: { partId: 'topsides', side: 'starboard' },
        estimateMinutes: 1080,
      },
    ]);
  });

  test('is turned only in a shop that turns boats', () => {
    const turns = (chosen: BoatToWorkOn['chosen']) =>
      titles(workOf(template, { chosen }).ops).filter((title) => title.startsWith('Turn '));
    expect(turns(['bottom_scope'])).toEqual([]);
    expect(turns(['bottom_scope', 'turn_over'])).toHaveLength(2);
  });
});

describe('a lapstrake boat', () => {
  const template = templates.get('painted_lapstrake')!;

  test('keeps a place of many words out of the title', () => {
    const dent = { words: 'x'.repeat(500), side: 'port' as const };
    const { tasks } = workOf(template, { counts: { places: { raise_dents_wet_cloth_cloth: [dent] } } });
    const task = tasks.find(({ templateId }) => templateId?.endsWith('/raise_dents_wet_cloth_cloth'));
    expect([task?.title, task?.place]).toEqual(['Raise dents, port: wet cloth, or cloth and heat', dent]);
  });

  test('asks for ribs, planks and length, and whether she is turned', () => {
    const { choices, counts, places } = questionsOf(template);
    expect([choices, counts]).toEqual([['turn_over'], ['ribs', 'planks', 'lengthMm']]);
    expect(places.map(({ id }) => id)).toEqual(['dutchman_scarf_split', 'raise_dents_wet_cloth_cloth']);
  });

  test('counts ribs by number and side where they are known, and otherwise one of so many', () => {
    const { tasks } = workOf(template, {
      counts: { ribs: [{ number: 9, side: 'port' }, {}, { number: 4 }] },
    });
    const steamed = tasks.filter(({ templateId }) => templateId === 'painted_lapstrake/steam_fit_ribs_each');
    expect(steamed.map(({ title, place }) => [title, place])).toEqual([
      ['Steam and fit rib 9 port', { partId: 'bent_rib', number: 9, side: 'port' }],
      ['Steam and fit rib 2 of 3', { partId: 'bent_rib' }],
      ['Steam and fit rib 4', { partId: 'bent_rib', number: 4 }],
    ]);
  });

  test('takes four hours a ten feet for her laps, and no estimate where her length is not known', () => {
    const laps = (counts: BoatToWorkOn['counts']) =>
      workOf(template, { ...(counts ? { counts } : {}) }).tasks.find(({ title }) =>
        title.startsWith('Rivet laps'),
      )!;
    expect(laps({ lengthMm: 6096 }).estimateMinutes).toBe(480);
    expect(laps({})).not.toHaveProperty('estimateMinutes');
  });

  test('has a task at each place that is named, called by its words', () => {
    const { tasks } = workOf(template, {
      counts: {
        places: { raise_dents_wet_cloth_cloth: [{ words: 'two feet aft of the stem', side: 'port' }] },
      },
    });
    const dents = tasks.filter(({ templateId }) => templateId?.endsWith('/raise_dents_wet_cloth_cloth'));
    expect(dents.map(({ title, place }) => [title, place])).toEqual([
      [
        'Raise dents, two feet aft of the stem port: wet cloth, or cloth and heat',
        { words: 'two feet aft of the stem', side: 'port' },
      ],
    ]);
  });
});

test('stages that are listed in order stay as they are listed', () => {
  for (const { stages } of templates.values()) expect(inOrder(stages)).toEqual(stages);
});

test('stages in any order and after any others are put in order, or the circle is named', () => {
  const stages = fc.integer({ min: 1, max: 8 }).chain((count) => {
    const ids = Array.from({ length: count }, (_, index) => `s${index}`);
    return fc.tuple(
      ...ids.map((id) =>
        fc.record({ id: fc.constant(id), after: fc.subarray(ids, { maxLength: Math.min(2, count) }) }),
      ),
    );
  });
  let circles = 0;
  fc.assert(
    fc.property(stages, (listed) => {
      const hasCircle = [...reached(listed.map(({ id, after }) => [id, after]))].some(([id, before]) =>
        before.has(id),
      );
      if (hasCircle) {
        circles += 1;
        expect(() => inOrder(listed)).toThrow('in a circle');
        return;
      }
      const ordered = inOrder(listed);
      expect(new Set(ordered)).toEqual(new Set(listed));
      for (const [index, { after }] of ordered.entries()) {
        const before = ordered.slice(0, index).map(({ id }) => id);
        for (const id of after) expect(before).toContain(id);
      }
    }),
  );
  expect(circles).toBeGreaterThan(0);
});

function idOf(stages: { stageId: string; templateId?: string | undefined }[], stageId: string): string {
  return stages.find((stage) => stage.stageId === stageId)!.templateId!.split('/')[1]!;
}

/** All that each comes after, at one remove or many. */
function reached(edges: [string, string[]][]): Map<string, Set<string>> {
  const sets = new Map(edges.map(([id, after]) => [id, new Set(after)]));
  for (let round = 0; round < edges.length; round += 1) {
    for (const before of sets.values()) {
      for (const id of [...before]) for (const further of sets.get(id) ?? []) before.add(further);
    }
  }
  return sets;
}
