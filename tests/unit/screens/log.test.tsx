import { cleanup, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { TEXT_UNITS_MAX } from '#shared/sync/op.ts';
import { CrewPhone } from '#tests/unit/screens/crew-phone.tsx';

// The form for an entry on the real replica over a real (in-memory) IndexedDB and the real merge.

const user = userEvent.setup();
let crew: CrewPhone;

beforeEach(async () => {
  crew = await CrewPhone.open();
});
afterEach(() => {
  cleanup();
  crew.phone.cutPower();
});

const words = () => screen.findByRole<HTMLTextAreaElement>('textbox', { name: 'What did you do?' });
const press = async (name: string | RegExp) => user.click(await screen.findByRole('button', { name }));
const entries = () => crew.replica.view().all('entry');

async function write(text: string) {
  await user.click(await words());
  await user.paste(text);
}

describe('what is typed', () => {
  test('is still there when the phone dies and is started again', async () => {
    crew.show('/log');
    await write('Took up the king plank');
    await press('4 h');
    await waitFor(() => expect(crew.replica.draft.read('log')).toMatchObject({ minutes: 240 }));
    await crew.dieAndStart();
    crew.show('/log');
    expect((await words()).value).toBe('Took up the king plank');
    expect(screen.getByRole<HTMLInputElement>('textbox', { name: 'Your hours' }).value).toBe('4');
    expect(screen.getByText(/as you left it/)).toBeTruthy();
  });

  test('waits under the key while another screen is open', async () => {
    crew.show('/log');
    await write('Half a sentence');
    await user.click(screen.getByRole('link', { name: /^Back to Alongside/ }));
    expect(await screen.findByText(/^Not logged yet/)).toBeTruthy();
    await user.click(screen.getByRole('link', { name: 'Go on' }));
    expect((await words()).value).toBe('Half a sentence');
  });

  test('can be emptied, and brought back', async () => {
    crew.show('/log');
    await write('Nonsense');
    await press('Empty the form');
    expect((await words()).value).toBe('');
    await press('Undo');
    expect((await words()).value).toBe('Nonsense');
  });

  test('is told to be too long and not lost, and nothing is logged', async () => {
    crew.show('/log');
    const tooLong = 'x'.repeat(TEXT_UNITS_MAX + 12);
    await write(tooLong);
    expect(await screen.findByText(/^That is 12 characters too many/)).toBeTruthy();
    await press('Log it');
    expect(entries()).toEqual([]);
    expect((await words()).value).toBe(tooLong);
  });
});

describe("'Log it'", () => {
  test('asks for words or hours where there are neither', async () => {
    crew.show('/log');
    await press('Log it');
    expect(await screen.findByText('Say what you did, or give the hours.')).toBeTruthy();
    expect(entries()).toEqual([]);
  });

  test('without signal makes the entry and its tick durable, and shows them as held', async () => {
    crew.phone.network = { ...crew.phone.network, isUp: false };
    crew.show('/log');
    await write('Drew the screws');
    await press('2 h');
    await user.click(screen.getByRole('checkbox', { name: 'Wes' }));
    await user.click(screen.getByRole('checkbox', { name: 'Draw the screws' }));
    await press('Log it');
    expect(await screen.findByText('Logged on Penny Candle: 4 h, 1 task ticked')).toBeTruthy();
    expect(screen.getAllByText('2 held on this computer').length).toBeGreaterThan(0);
    await crew.dieAndStart();
    const [entry] = entries();
    expect(entry).toMatchObject({ text: 'Drew the screws', workDate: '2026-06-01', boatId: crew.boatId });
    expect(entry!.hours.map(({ minutes }) => minutes)).toEqual([120, 120]);
    const task = crew.replica.view().find('task', crew.taskId)!;
    expect(task.marks).toMatchObject([{ entryId: entry!.id, takenBack: null }]);
    expect(crew.replica.draft.read('log')).toBeUndefined();
  });

  test('is taken back at once by a strike, the tick with it, and the words are on the form again', async () => {
    crew.show('/log');
    await write('Drew the screws');
    await user.click(screen.getByRole('checkbox', { name: 'Draw the screws' }));
    await press('Log it');
    await press('Undo');
    await waitFor(() => expect(entries()[0]!.struck).toMatchObject({ why: 'undone at once' }));
    expect(crew.replica.view().find('task', crew.taskId)!.done).toBe(false);
    await user.click(await screen.findByRole('link', { name: 'Go on' }));
    expect((await words()).value).toBe('Drew the screws');
    expect(screen.getByRole<HTMLInputElement>('checkbox', { name: 'Draw the screws' }).checked).toBe(true);
    await press('Log it');
    await waitFor(() => expect(entries().filter(({ struck }) => !struck)).toHaveLength(1));
  });

  test('cut off between the entry and its tick neither doubles the entry nor loses the tick', async () => {
    const { replica, boatId, stageId, taskId } = crew;
    const [entryId, markId] = [replica.newId(), replica.newId()];
    const draft = {
      entryId,
      boatId,
      stageId,
      text: 'Drew the screws',
      workDate: '2026-06-01',
      minutes: null,
      kind: null,
      along: [],
      ticked: [{ taskId, markId }],
      keptAt: '2026-06-01T08:00:00.000Z',
    };
    await replica.draft.write('log', draft);
    await replica.hold('entry.write', {
      entryId,
      boatId,
      stageId,
      workDate: draft.workDate,
      text: draft.text,
      spoken: false,
      hours: [],
    });
    await crew.dieAndStart();
    crew.show('/log');
    expect((await words()).value).toBe('');
    expect(screen.getByRole<HTMLInputElement>('checkbox', { name: 'Draw the screws' }).checked).toBe(true);
    expect(entries()).toHaveLength(1);
  });
});

test('the whole form can be worked with the keyboard alone', async () => {
  crew.show('/log');
  await words();
  expect(document.activeElement).toBe(await words());
  await user.keyboard('Fan on');
  // past 'Not done, and why' and the figure itself
  for (let steps = 0; steps < 3; steps += 1) await user.tab();
  await user.keyboard('{Enter}');
  const main = screen.getByRole('button', { name: 'Log it' });
  for (let steps = 0; document.activeElement !== main && steps < 40; steps += 1) await user.tab();
  await user.keyboard('{Enter}');
  await waitFor(() => expect(entries()).toHaveLength(1));
  expect(entries()[0]).toMatchObject({ text: 'Fan on', hours: [{ minutes: 15 }] });
});
