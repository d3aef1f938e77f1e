import { cleanup, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { CrewPhone } from '#tests/unit/screens/crew-phone.tsx';

// What the keys under the line do, on the real replica over a real (in-memory) IndexedDB.

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
const entries = () => crew.replica.view().all('entry');

async function holdEntry(given: object = {}): Promise<string> {
  const { replica, boatId, stageId } = crew;
  const entryId = replica.newId();
  const written = {
    entryId,
    boatId,
    stageId,
    workDate: '2026-06-01',
    text: 'Reefed',
    spoken: false,
    hours: [],
  };
  await replica.hold('entry.write', { ...written, ...given });
  return entryId;
}

describe("the 'Hours' key", () => {
  test('logs hours by themselves where nothing is logged yet, and takes them back', async () => {
    crew.show('/alongside');
    await press('Hours');
    await press('4 h');
    await press('Log the hours');
    await waitFor(() => expect(entries()).toMatchObject([{ text: '', hours: [{ minutes: 240 }] }]));
    expect(await screen.findByText('Your hours: 4 h')).toBeTruthy();
    await press('Undo');
    await waitFor(() => expect(entries()[0]!.struck).not.toBeNull());
  });

  test("puts them into today's entry, without a reason while it has none", async () => {
    await holdEntry();
    crew.show('/alongside');
    await press('Hours');
    await press('2 h');
    await press('Put them into the entry');
    await waitFor(() => expect(entries()).toMatchObject([{ text: 'Reefed', hours: [{ minutes: 120 }] }]));
  });

  test('asks why a figure that stands is changed, and brings it back', async () => {
    await holdEntry({ hours: [{ personId: crew.replica.view().me.personId, minutes: 60 }] });
    crew.show('/alongside');
    await press('Hours');
    await press('2 h');
    await press('Put them into the entry');
    expect(await screen.findByText('Write the reason in a few words.')).toBeTruthy();
    await user.type(screen.getByRole('textbox', { name: 'Why do they change?' }), 'swept up too');
    await press('Put them into the entry');
    await waitFor(() => expect(entries()[0]!.hours[0]!.minutes).toBe(120));
    await press('Undo');
    await waitFor(() => expect(entries()[0]!.hours[0]!.minutes).toBe(60));
  });
});

test('the same as the last day brings people and stage into the form, and no words', async () => {
  const { me } = crew.replica.view();
  const wes = crew.replica
    .view()
    .all('person')
    .find(({ name }) => name === 'Wes')!;
  const hours = [me.personId, wes.id].map((personId) => ({ personId, minutes: 60 }));
  await holdEntry({ workDate: '2026-05-31', hours });
  crew.show('/log');
  await press(/^Same as yesterday/);
  expect(screen.getByRole<HTMLInputElement>('checkbox', { name: 'Wes' }).checked).toBe(true);
  expect(screen.getByRole<HTMLTextAreaElement>('textbox', { name: 'What did you do?' }).value).toBe('');
  expect(screen.queryByRole('button', { name: /^Same as/ })).toBeNull();
});

test('work that was not done is logged as the person saw it', async () => {
  crew.show('/log');
  await press('Not done, and why');
  await user.type(await screen.findByRole('textbox', { name: 'What was not done?' }), 'varnish coat three');
  await user.type(screen.getByRole('textbox', { name: 'Why not?' }), '74 percent');
  const seen = screen.getByText('Not done: varnish coat three. Why: 74 percent.').textContent;
  await press('Log it');
  await waitFor(() => expect(entries()).toHaveLength(1));
  expect(entries()[0]!.text).toBe(seen);
});

test('earlier days are a month or a date away, and today one tap', async () => {
  await holdEntry({ workDate: '2026-04-20', text: 'April work' });
  await holdEntry({ workDate: '2026-05-12', text: 'May work' });
  crew.show('/alongside');
  await press('Earlier days');
  await user.click(
    within(await screen.findByRole('group', { name: 'Months' })).getByRole('button', { name: /^April/ }),
  );
  expect(await screen.findByText('April work')).toBeTruthy();
  expect(screen.queryByText('May work')).toBeNull();
  await press('Today');
  expect(await screen.findByText('May work')).toBeTruthy();
});

test('the search finds what this phone carries and leads there', async () => {
  const entryId = await holdEntry({ text: 'Bedded beam four in white' });
  crew.show('/search');
  await user.type(await screen.findByRole('searchbox'), 'beam 4');
  const hit = await screen.findByRole('link', { name: /^Bedded beam four/ });
  expect(hit.getAttribute('href')).toBe(`/entry/${entryId}`);
  await user.click(hit);
  expect(await screen.findByRole('button', { name: 'Change the words' })).toBeTruthy();
});

test('a change of an entry can be taken back at once, the change staying in its history', async () => {
  crew.show(`/entry/${await holdEntry()}`);
  await press('Change the words');
  await user.type(screen.getByRole('textbox', { name: 'The words' }), ' the port seams');
  await press('Change it');
  await waitFor(() => expect(entries()[0]!.text).toBe('Reefed the port seams'));
  await press('Undo');
  await waitFor(() => expect(entries()[0]!.text).toBe('Reefed'));
  expect(await screen.findByText('Why: undone at once')).toBeTruthy();
});
