import { beforeAll, describe, expect, test } from 'vitest';
import { DEMO_BOATS } from '#server/demo/demo-boats.ts';
import { DEMO_PHOTOS } from '#server/demo/demo-photos.ts';
import { PICTURE_NAMES } from '#server/demo/pictures/album.ts';
import type { Pictures } from '#server/demo/pictures/develop.ts';
import { isTemplateId, loadTemplate } from '#shared/trade/load.ts';
import { PARTS } from '#shared/trade/parts.ts';
import { FINDING_KINDS } from '#shared/trade/finding-kinds.ts';
import { demoWorld, type DemoWorld } from '#tests/worlds/demo.ts';
import { standInPictures } from '#tests/worlds/stand-in-pictures.ts';

const TUESDAY_NOON = Date.parse('2026-05-05T16:00:00Z');
const TEMPLATED_SHARE_MIN = 0.8;

let pictures: Pictures;
let world: DemoWorld;

beforeAll(async () => {
  pictures = await standInPictures();
  world = await demoWorld(TUESDAY_NOON, { pictures });
});

const boatNamed = (name: string) => world.view.all('boat').find((boat) => boat.name === name)!;

describe('the work on the demo’s boats', () => {
  test('is the templates’, all but some tasks of their own, and each boat is somewhere else in it', async () => {
    const tasks = world.view.all('task');
    const templated = tasks.filter((task) => task.templateId);
    expect(templated.length / tasks.length).toBeGreaterThan(TEMPLATED_SHARE_MIN);
    for (const { particulars, template } of Object.values(DEMO_BOATS)) {
      const boat = boatNamed(particulars.name);
      expect(boat.templateId).toBe(template);
      const known = (await loadTemplate(template)).stages.map(({ id }) => `${template}/${id}`);
      const stages = world.view.all('stage').filter(({ boatId }) => boatId === boat.id);
      for (const stage of stages) expect(known).toContain(stage.templateId);
      expect(stages.some((stage) => stage.done)).toBe(true);
      expect(stages.some((stage) => !stage.done)).toBe(true);
    }
    expect(templated.every((task) => isTemplateId(task.templateId!.split('/')[0]!))).toBe(true);
  });

  test('goes back three months', () => {
    const days = world.view
      .all('entry')
      .map((entry) => entry.workDate)
      .sort();
    expect(days[0]! < '2026-02-10').toBe(true);
    expect(days.at(-1)).toBe('2026-05-05');
    expect(world.view.all('entry').some((entry) => entry.writtenLater)).toBe(true);
    expect(world.view.all('entry').filter(({ text }) => text.startsWith('Not done:')).length).toBeGreaterThan(
      3,
    );
  });

  test('has hours of every kind, most of them set and the newest not', () => {
    const figures = world.view
      .all('entry')
      .flatMap(({ hours, workDate }) => hours.map((one) => ({ ...one, workDate })));
    const kinds = new Set(figures.map(({ kind }) => kind));
    for (const kind of ['agreed', 'extra', 'waiting', 'own-fault', 'teaching', 'yard'] as const)
      expect(kinds).toContain(kind);
    const set = figures.filter(({ proposed }) => !proposed);
    expect(set.length / figures.length).toBeGreaterThan(0.75);
    expect(figures.filter(({ workDate }) => workDate >= '2026-05-04').every(({ proposed }) => proposed)).toBe(
      true,
    );
  });
});

describe('what was found', () => {
  test('is of the trade’s kinds, on its parts, with its entry', () => {
    const parts = new Set(PARTS.map(({ id }) => id));
    const findings = world.view.all('finding');
    expect(findings.length).toBeGreaterThan(20);
    for (const { kind, place, entryId } of findings) {
      expect(FINDING_KINDS).toContain(kind);
      expect(parts).toContain(place.partId);
      expect(world.view.find('entry', entryId!)).toBeDefined();
    }
    const sounds = world.view.all('sound');
    expect(sounds.length).toBeGreaterThan(10);
    for (const { place } of sounds) expect(parts).toContain(place.partId);
  });

  test('was suspected first and proved later, on both sides, once struck', () => {
    const findings = world.view.all('finding');
    const proved = findings.filter((row) => row.certainty === 'proved' && row.heads.certainty);
    expect(proved.length).toBeGreaterThanOrEqual(5);
    expect(findings.filter((row) => row.struck)).toHaveLength(1);
    expect(findings.some((row) => row.certainty === 'suspected')).toBe(true);
    const floors = findings
      .filter(({ place }) => place.partId === 'floor_timber')
      .map(({ place }) => place.side);
    expect(new Set(floors)).toEqual(new Set(['port', 'starboard']));
    const floorPort = findings.find(({ place }) => place.partId === 'floor_timber' && place.side === 'port')!;
    expect(floorPort).toMatchObject({ kind: 'rot', seenExtent: { lengthMm: 203, depthMm: 44 } });
  });
});

describe('the photos', () => {
  test('are each picture once, over the boats, days and sets', () => {
    const photos = world.view.all('photo');
    expect(DEMO_PHOTOS.map(({ of }) => of).sort()).toEqual([...PICTURE_NAMES].sort());
    expect(photos).toHaveLength(PICTURE_NAMES.length);
    expect(new Set(photos.map(({ sha256 }) => sha256)).size).toBe(photos.length);
    for (const { particulars } of Object.values(DEMO_BOATS)) {
      const own = photos.filter(({ boatId }) => boatId === boatNamed(particulars.name).id);
      expect(own.length, particulars.name).toBeGreaterThanOrEqual(12);
    }
    for (const set of ['arrival', 'before', 'after', 'before-closing', 'mark'] as const)
      expect(photos.filter((photo) => photo.set === set).length, set).toBeGreaterThanOrEqual(2);
    expect(new Set(photos.map(({ attachedOn }) => attachedOn)).size).toBeGreaterThan(25);
    expect(photos.filter(({ caption }) => caption).length).toBeLessThan(photos.length / 2);
  });

  test('know where they were taken, all but a few, and what they are of', () => {
    const photos = world.view.all('photo');
    expect(photos.filter(({ place }) => place).length / photos.length).toBeGreaterThan(0.9);
    const parts = new Set(PARTS.map(({ id }) => id));
    for (const { place, findingId, boatId, takenAt, attachedAt } of photos) {
      if (place) expect(parts).toContain(place.partId);
      if (findingId) expect(world.view.find('finding', findingId)!.boatId).toBe(boatId);
      expect(Date.parse(takenAt!)).toBeLessThan(Date.parse(attachedAt));
    }
    expect(photos.filter(({ findingId }) => findingId).length).toBeGreaterThan(20);
  });

  test('change nothing else, and are left out where there are no pictures', async () => {
    const without = await demoWorld(TUESDAY_NOON);
    expect(without.view.all('photo')).toEqual([]);
    for (const entity of ['entry', 'task', 'finding', 'sound'] as const)
      expect(without.view.all(entity)).toHaveLength(world.view.all(entity).length);
    expect(world.outcomes.filter(({ outcome }) => outcome === 'set-aside')).toHaveLength(1);
  });
});
