import { describe, expect, test } from 'vitest';
import { TEXT_UNITS_MAX } from '#shared/sync/op.ts';
import { DraftWriter } from '#src/routes/alongside/draft-writer.ts';
import {
  draftProblems,
  emptyDraft,
  hoursOf,
  isWorthKeeping,
  readDraft,
} from '#src/routes/alongside/log/entry-draft.ts';
import { tooLongWords } from '#src/words/too-long.ts';

const [ME, WES, KIT] = ['me', 'wes', 'kit'];
const ENTRY_ID = '0193a000-0000-7000-8000-000000000009';
const empty = emptyDraft({ boatId: 'boat', stageId: null }, '2026-05-04', ENTRY_ID);

describe('the hours of a draft', () => {
  test('of those who worked along are as mine until they are changed', () => {
    const along = [
      { personId: WES, minutes: null },
      { personId: KIT, minutes: 30 },
    ];
    expect(hoursOf({ ...empty, minutes: 150, along }, ME)).toEqual([
      { personId: ME, minutes: 150 },
      { personId: WES, minutes: 150 },
      { personId: KIT, minutes: 30 },
    ]);
  });

  test('leave out whoever has none, and carry the kind that is proposed', () => {
    const along = [{ personId: WES, minutes: 0 }];
    expect(hoursOf({ ...empty, minutes: 60, kind: 'extra', along }, ME)).toEqual([
      { personId: ME, minutes: 60, kind: 'extra' },
    ]);
  });
});

describe('what keeps a draft from being logged', () => {
  test('is having neither words nor hours', () => {
    expect(draftProblems(empty, ME)).toEqual({ text: 'Say what you did, or give the hours.' });
    expect(draftProblems({ ...empty, text: 'Fan on' }, ME)).toEqual({});
    expect(draftProblems({ ...empty, minutes: 15 }, ME)).toEqual({});
  });

  test('is somebody along without hours of anybody', () => {
    const draft = { ...empty, text: 'Lifted the engine', along: [{ personId: WES, minutes: null }] };
    expect(draftProblems(draft, ME)).toEqual({ along: 'Give your hours, or theirs.' });
  });

  test('is a text that is too long, told with how much and what to do', () => {
    expect(tooLongWords('x'.repeat(TEXT_UNITS_MAX))).toBeUndefined();
    expect(tooLongWords('x'.repeat(TEXT_UNITS_MAX + 3))).toMatch(
      /^That is 3 characters too many .* Nothing is lost/,
    );
  });
});

describe('a draft that was kept', () => {
  test('reads back as it was', () => {
    const draft = {
      ...empty,
      text: 'Reefed',
      along: [{ personId: WES, minutes: null }],
      keptAt: '2026-05-04T08:00:00Z',
    };
    expect(readDraft(JSON.parse(JSON.stringify(draft)))).toEqual(draft);
  });

  test('by another version keeps its words whatever else cannot be read', () => {
    const kept = { ...empty, text: 'Reefed', along: 'Wes', kind: 'overtime', ticked: [{ taskId: 1 }] };
    expect(readDraft(kept)).toMatchObject({ text: 'Reefed', along: [], kind: null, ticked: [] });
  });

  test('is none where nothing was', () => {
    expect(readDraft(undefined)).toBeUndefined();
    expect(isWorthKeeping(empty)).toBe(false);
    expect(isWorthKeeping({ ...empty, minutes: 0 })).toBe(true);
  });
});

describe('keeping a draft', () => {
  function slowStore() {
    const calls: unknown[] = [];
    const waiting: (() => void)[] = [];
    const slow = (call: unknown) => {
      calls.push(call);
      return new Promise<void>((resolve) => waiting.push(resolve));
    };
    return {
      calls,
      release: () => waiting.shift()!(),
      write: (_key: string, value: unknown) => slow(value),
      clear: () => slow('cleared'),
    };
  }

  const settled = () => new Promise((resolve) => setTimeout(resolve));

  test('writes one state at a time, and the newest of what came meanwhile', async () => {
    const store = slowStore();
    const writer = new DraftWriter(store, 'log', () => expect.unreachable());
    const kept = [writer.keep('a'), writer.keep('ab'), writer.keep('abc')];
    expect(store.calls).toEqual(['a']);
    store.release();
    await settled();
    expect(store.calls).toEqual(['a', 'abc']);
    store.release();
    await Promise.all(kept);
  });

  test('never brings back what was cleared while a write was running', async () => {
    const store = slowStore();
    const writer = new DraftWriter(store, 'log', () => expect.unreachable());
    void writer.keep('a');
    const cleared = writer.clear();
    store.release();
    await settled();
    store.release();
    await cleared;
    expect(store.calls).toEqual(['a', 'cleared']);
  });

  test('says so where the device cannot, and goes on trying with what comes', async () => {
    const failures: unknown[] = [];
    const written: unknown[] = [];
    const store = {
      write: (_key: string, value: unknown) =>
        written.push(value) === 1 ? Promise.reject(new Error('no room')) : Promise.resolve(),
      clear: () => Promise.resolve(),
    };
    const writer = new DraftWriter(store, 'log', (error) => failures.push(error));
    await writer.keep('a');
    await writer.keep('ab');
    expect(failures).toHaveLength(1);
    expect(written).toEqual(['a', 'ab']);
  });
});
