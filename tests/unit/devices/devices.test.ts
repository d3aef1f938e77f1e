import { expect, test } from 'vitest';
import { readDevices } from '#src/routes/devices/read-devices.ts';
import { readPeople } from '#src/routes/people/read-people.ts';
import { TestRecord } from '#tests/worlds/record.ts';

function shop() {
  const record = new TestRecord();
  const orrin = record.hand('Orrin', 'foreman');
  const hob = record.hand('Hob', 'crew', 'owner');
  return { record, orrin, hob };
}

test('a device that holds something comes first, with how much and since when; one out of use comes last', () => {
  const { record, orrin, hob } = shop();
  const [oldId, deskId] = [record.newId(), record.newId()];
  record.device({
    id: oldId,
    label: "Hob's first phone",
    personIds: [hob.personId],
    lastHeardAt: '2026-05-01T06:00:00.000Z',
  });
  record.device({
    id: deskId,
    label: 'Desk',
    personIds: [orrin.personId],
    lastHeardAt: '2026-05-04T05:59:00.000Z',
  });
  record.device({
    id: hob.deviceId,
    label: "Hob's phone",
    personIds: [hob.personId],
    replaces: oldId,
    lastHeardAt: '2026-05-04T05:35:00.000Z',
    held: { ops: 3, photos: 1, oldest: '2026-05-03T12:20:00.000Z' },
  });
  const lines = readDevices(record.viewAs(orrin));
  expect(lines.map(({ label, held, heard }) => [label, held, heard])).toEqual([
    ["Hob's phone", 'held 4 things, the oldest of Sun 13:20', 'heard 06:35'],
    ['Desk', null, 'heard 06:59'],
    ["Hob's first phone", null, 'heard Fri 07:00'],
  ]);
  expect(lines[0]!.notes).toEqual(["in place of Hob's first phone"]);
  expect(lines[2]!.gap).toMatch(/^Hob's first phone was last heard Fri 07:00, and was replaced\./);
});

test('a device that was shut out says when', () => {
  const { record, orrin, hob } = shop();
  const [label, personIds] = ["Hob's phone", [hob.personId]];
  record.device({ id: hob.deviceId, label, personIds, revokedAt: '2026-05-03T12:00:00.000Z' });
  expect(readDevices(record.viewAs(orrin))[0]!.revoked).toBe('shut out Sun 3 May');
});

test('people are told with all their roles and boats, and those who have left stand apart', () => {
  const { record, orrin, hob } = shop();
  const boatId = record.newId();
  record.store.put('boat', boatId, { id: boatId, name: 'Brindle', struck: null, statements: [] });
  record.store.put('person', hob.personId, {
    id: hob.personId,
    name: 'Hob',
    roles: ['crew', 'owner'],
    leftAt: null,
    boatIds: [boatId],
  });
  const gone = record.newId();
  record.store.put('person', gone, {
    id: gone,
    name: 'Gus',
    roles: ['crew'],
    leftAt: '2026-05-02T10:00:00.000Z',
    boatIds: [],
  });
  const { here, left } = readPeople(record.viewAs(orrin));
  expect(here.map(({ row, words }) => [row.name, words])).toEqual([
    ['Hob', 'crew and owner of Brindle'],
    ['Orrin', 'foreman'],
  ]);
  expect(left.map(({ row, left: words }) => [row.name, words])).toEqual([['Gus', 'left Sat 2 May']]);
});
