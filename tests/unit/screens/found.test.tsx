import { cleanup, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { CrewPhone } from '#tests/unit/screens/crew-phone.tsx';

// Findings, what was found sound and photographs, on the real replica over a real (in-memory) IndexedDB.

const user = userEvent.setup();
let crew: CrewPhone;

beforeEach(async () => {
  crew = await CrewPhone.open();
});
afterEach(() => {
  cleanup();
  crew.phone.cutPower();
});

const press = async (name: string | RegExp) => user.click(await screen.findByRole('button', { name }));
const findings = () => crew.replica.view().all('finding');
const photos = () => crew.replica.view().all('photo');
const picture = (name: string) => new File([`picture ${name}`], name, { type: 'image/jpeg' });

async function choose(...names: string[]) {
  await user.upload(await screen.findByLabelText('Choose photos'), names.map(picture));
  await screen.findByRole('button', { name: `Take photo ${names.length} out` });
}

async function choosePart(asked: string, part: string) {
  await press(/^(Which part|.*other part)/);
  await user.type(await screen.findByRole('searchbox', { name: 'Look for a part' }), asked);
  await press(part);
}

describe('a finding', () => {
  test('is logged with its place and photos as one, shown on the line, and taken back at once with all of it', async () => {
    crew.show('/found');
    await press('Rot');
    await choosePart('beam', 'Deck beam');
    await press('Port');
    await user.type(screen.getByRole('textbox', { name: 'Number' }), '4');
    await choose('a.jpg', 'b.jpg');
    await press('Log the finding');
    expect(await screen.findByText('Found: Rot, deck beam 4 port')).toBeTruthy();
    expect(findings()).toMatchObject([
      {
        kind: 'rot',
        place: { partId: 'deck_beam', side: 'port', number: 4 },
        known: 'seen',
        certainty: 'suspected',
        stageId: crew.stageId,
      },
    ]);
    expect(photos().map(({ findingId, place }) => [findingId, place?.number])).toEqual([
      [findings()[0]!.id, 4],
      [findings()[0]!.id, 4],
    ]);
    await press('Undo');
    await waitFor(() => expect(findings()[0]!.struck?.why).toBe('undone at once'));
    expect(photos().every(({ struck }) => struck !== null)).toBe(true);
  });

  test('is kept at every tap, through a death of the phone, its photos with it', async () => {
    crew.show('/found');
    await press('Open seam');
    await choose('a.jpg');
    await user.type(screen.getByRole('textbox', { name: 'In your own words' }), 'light through it');
    await waitFor(() => expect(crew.replica.draft.read('found')).toMatchObject({ text: 'light through it' }));
    await crew.dieAndStart();
    crew.show('/found');
    expect((await screen.findByRole('button', { name: 'Open seam' })).getAttribute('aria-pressed')).toBe(
      'true',
    );
    await press('Log the finding');
    await waitFor(() => expect(photos()).toHaveLength(1));
    expect(findings()).toMatchObject([{ kind: 'open_seam', text: 'light through it' }]);
  });

  test('asks what it is where nothing is chosen, and takes own words for it', async () => {
    crew.show('/found');
    await press('Log the finding');
    expect((await screen.findAllByText(/^Say what it is/)).length).toBeGreaterThan(0);
    expect(findings()).toEqual([]);
    await press('Something else, or your own words');
    await user.type(await screen.findByRole('textbox', { name: /^Look for it/ }), 'popped rivets');
    await press('Call it ‘popped rivets’');
    await press('Log the finding');
    await waitFor(() => expect(findings()).toMatchObject([{ kind: 'popped rivets' }]));
  });

  test('is proved by opening up, and measured by keys', async () => {
    crew.show('/found');
    await press('Rot');
    await press('Opened up');
    await press(/^Seen not measured/);
    const dialog = within(await screen.findByRole('dialog'));
    for (const key of ['2', '9', '8']) await user.click(dialog.getByRole('button', { name: key }));
    await user.click(dialog.getByRole('button', { name: /^Depth/ }));
    for (const key of ['1', '3']) await user.click(dialog.getByRole('button', { name: key }));
    await press('That is it');
    await press('Log the finding');
    await waitFor(() =>
      expect(findings()).toMatchObject([
        { certainty: 'proved', known: 'opened', seenExtent: { lengthMm: 298, depthMm: 13 } },
      ]),
    );
  });

  test('carries its part, side and number on to the next one and to the next photo, on the same boat', async () => {
    crew.show('/found');
    await press('Rot');
    await choosePart('beam', 'Deck beam');
    await press('Starboard');
    await press('Log the finding');
    await screen.findByText(/^Found: /);
    crew.show('/photos');
    await choose('a.jpg');
    await press('Log 1 photo');
    await waitFor(() => expect(photos()).toHaveLength(1));
    expect(photos()[0]!.place).toEqual({ partId: 'deck_beam', side: 'starboard' });
  });
});

test('what was looked at and found sound is a record of its own', async () => {
  crew.show('/found');
  await user.click(await screen.findByRole('radio', { name: 'Looked, sound' }));
  await press('Log it as sound');
  expect(await screen.findByText(/^Say what was looked at/)).toBeTruthy();
  await choosePart('keel', 'Keel');
  await press('Rot');
  await press('Probed');
  await press('Log it as sound');
  expect((await screen.findAllByText('Sound: keel centre, no rot')).length).toBeGreaterThan(0);
  expect(crew.replica.view().all('sound')).toMatchObject([
    { place: { partId: 'keel', side: 'centre' }, about: 'rot', known: 'probed' },
  ]);
  expect(findings()).toEqual([]);
});

describe("a finding's page", () => {
  async function holdFinding() {
    const { replica, boatId, stageId } = crew;
    const findingId = replica.newId();
    await replica.hold('finding.note', {
      findingId,
      boatId,
      stageId,
      kind: 'rot',
      place: { partId: 'stem' },
      known: 'sounded',
      certainty: 'suspected',
      text: 'dull',
    });
    return findingId;
  }

  test('keeps that it was suspected when it is proved', async () => {
    crew.show(`/finding/${await holdFinding()}`);
    await press('Change it');
    await press('Opened up');
    await user.type(screen.getByRole('textbox', { name: /^Why\?/ }), 'took the plank off');
    const sheet = within(screen.getByRole('dialog'));
    await user.click(sheet.getByRole('button', { name: 'Change it' }));
    await waitFor(() => expect(findings()[0]).toMatchObject({ known: 'opened', certainty: 'proved' }));
    const history = await screen.findByRole('region', { name: /^History of this finding/ });
    expect(within(history).getByText('suspected')).toBeTruthy();
    expect(within(history).getAllByText('Why: took the plank off').length).toBeGreaterThan(0);
    await press('Undo');
    await waitFor(() => expect(findings()[0]).toMatchObject({ known: 'sounded', certainty: 'suspected' }));
  });

  test('is struck and brought back, each with its reason', async () => {
    crew.show(`/finding/${await holdFinding()}`);
    await press('Strike it');
    const dialog = within(await screen.findByRole('dialog'));
    await user.type(dialog.getByRole('textbox'), 'not hers');
    await user.click(dialog.getByRole('button', { name: 'Strike it' }));
    await waitFor(() => expect(findings()[0]!.struck?.why).toBe('not hers'));
    await press('Undo');
    await waitFor(() => expect(findings()[0]!.struck).toBeNull());
  });

  test('of one that is not here says so', async () => {
    crew.show(`/finding/${crew.replica.newId()}`);
    expect(await screen.findByText(/is not on this device/)).toBeTruthy();
  });
});

test('photos of an entry are shown with it, and one is put right on its own page', async () => {
  const { replica, boatId, stageId } = crew;
  const entryId = replica.newId();
  const written = {
    entryId,
    boatId,
    stageId,
    workDate: '2026-06-01',
    text: 'Took the sole up',
    spoken: false,
    hours: [],
  };
  await replica.hold('entry.write', written);
  crew.show(`/entry/${entryId}`);
  await user.click(await screen.findByRole('link', { name: 'Photo' }));
  await choose('a.jpg');
  await press('Before closing');
  await press('Log 1 photo');
  expect(await screen.findByText('1 photo logged')).toBeTruthy();
  expect(photos()).toMatchObject([{ entryId, set: 'before-closing', stageId }]);
  crew.show(`/photo/${photos()[0]!.id}`);
  await press('Change it');
  await user.type(await screen.findByRole('textbox', { name: 'Words under it' }), 'floor three');
  await user.click(within(screen.getByRole('dialog')).getByRole('button', { name: 'Change it' }));
  await waitFor(() => expect(photos()[0]!.caption).toBe('floor three'));
});

test('photos that were taken and not logged wait under the key', async () => {
  crew.show('/photos');
  await choose('a.jpg', 'b.jpg');
  await waitFor(() => expect(crew.replica.draft.read('photos')).toMatchObject({ pictures: [{}, {}] }));
  await user.click(screen.getByRole('link', { name: /^Back; your photos/ }));
  expect(await screen.findByText('Not logged yet: 2 photos.')).toBeTruthy();
  await user.click(screen.getByRole('link', { name: 'Photo' }));
  await press('Log 2 photos');
  await waitFor(() => expect(photos()).toHaveLength(2));
  await waitFor(() => expect(screen.queryByText(/^Not logged yet/)).toBeNull());
});
