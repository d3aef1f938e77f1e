import { cleanup, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { CrewPhone } from '#tests/unit/screens/crew-phone.tsx';

// An entry's page and the tasks' on the real replica over a real (in-memory) IndexedDB.

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
const entry = () => crew.replica.view().all('entry')[0]!;
const task = () => crew.replica.view().find('task', crew.taskId)!;

async function holdEntry() {
  const { replica, boatId, stageId } = crew;
  const entryId = replica.newId();
  const hours = [{ personId: replica.view().me.personId, minutes: 60 }];
  const written = { entryId, boatId, stageId, workDate: '2026-06-01', text: 'Reefed', spoken: false, hours };
  await replica.hold('entry.write', written);
  return entryId;
}

describe("an entry's page", () => {
  test('strikes only with a reason, and brings back', async () => {
    crew.show(`/entry/${await holdEntry()}`);
    await press('Strike it');
    await user.click(screen.getAllByRole('button', { name: 'Strike it' }).at(-1)!);
    expect(screen.getByText('Write the reason in a few words.')).toBeTruthy();
    expect(entry().struck).toBeNull();
    await user.type(screen.getByRole('textbox', { name: /^Why is it struck/ }), 'wrong boat');
    await user.click(screen.getAllByRole('button', { name: 'Strike it' }).at(-1)!);
    await waitFor(() => expect(entry().struck?.why).toBe('wrong boat'));
    await press('Bring it back');
    await user.type(screen.getByRole('textbox', { name: /^Why is it brought back/ }), 'it was right');
    await user.click(screen.getAllByRole('button', { name: 'Bring it back' }).at(-1)!);
    await waitFor(() => expect(entry().struck).toBeNull());
  });

  test('changes hours only with a reason, and keeps the old figure', async () => {
    crew.show(`/entry/${await holdEntry()}`);
    await press('Change the hours');
    await press('A quarter hour more');
    await press('Change it');
    expect(entry().hours[0]!.minutes).toBe(60);
    await user.type(screen.getByRole('textbox', { name: 'Why do they change?' }), 'cleaned up too');
    await press('Change it');
    await waitFor(() => expect(entry().hours[0]!.minutes).toBe(75));
    expect(await screen.findByText('Why: cleaned up too')).toBeTruthy();
  });

  test('keeps words that were begun while the sheet was shut, or the phone', async () => {
    const entryId = await holdEntry();
    crew.show(`/entry/${entryId}`);
    await press('Change the words');
    await user.type(screen.getByRole('textbox', { name: 'The words' }), ' the port seams');
    await waitFor(() => expect(crew.replica.draft.read(`words/${entryId}`)).toBe('Reefed the port seams'));
    await crew.dieAndStart();
    crew.show(`/entry/${entryId}`);
    await press('Change the words');
    await press('Change it');
    await waitFor(() => expect(entry().text).toBe('Reefed the port seams'));
  });

  test('of one that is not here says so', async () => {
    crew.show(`/entry/${crew.replica.newId()}`);
    expect(await screen.findByText(/is not on this device/)).toBeTruthy();
  });
});

describe('the tasks', () => {
  test('are started, ticked off and taken back', async () => {
    crew.show('/tasks');
    await press('Start: Draw the screws');
    expect(await screen.findByText(/^Started by you/)).toBeTruthy();
    await press('Tick off: Draw the screws');
    await waitFor(() => expect(task().done).toBe(true));
    await press('Undo');
    await waitFor(() => expect(task().done).toBe(false));
    expect(task().marks[0]!.takenBack).not.toBeNull();
  });

  test('get a new one, which says what is missing when it has no words', async () => {
    crew.show('/tasks');
    await press('Add the task');
    expect(await screen.findByText('Write what is to be done.')).toBeTruthy();
    await user.type(
      screen.getByRole('textbox', { name: 'Something else to be done here' }),
      'Bag the screws',
    );
    await press('Add the task');
    expect(await screen.findByRole('button', { name: 'Tick off: Bag the screws' })).toBeTruthy();
    expect(crew.replica.view().all('task')).toHaveLength(2);
  });
});

test('what is held is listed, and goes when it is sent', async () => {
  crew.phone.network = { ...crew.phone.network, isUp: false };
  await holdEntry();
  crew.show('/held');
  expect(await screen.findByText('Held, not sent yet (1)')).toBeTruthy();
  await press('Send now');
  expect(await screen.findByText(/^No way to the server just now/)).toBeTruthy();
  crew.phone.network = { ...crew.phone.network, isUp: true };
  await press('Send now');
  expect(await screen.findByText(/^Nothing is held/)).toBeTruthy();
  expect(await screen.findByText(/^Kept/)).toBeTruthy();
});
