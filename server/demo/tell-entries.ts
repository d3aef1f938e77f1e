import { workdayAfter } from './demo-days.ts';
import { DEMO_CHANGES, DEMO_ENTRIES, FIRST_LOGGED, type DemoChange } from './demo-entries.ts';
import { nameOf, type DemoEntry, type Figure } from './demo-entry.ts';
import type { PersonKey } from './demo-people.ts';
import type { SaidOp, Telling } from './telling.ts';

const KINDS_SET_AFTER_DAYS = 2;
const NEWEST_DAY_WITH_KINDS = -6;
/** One in so many the office sets, one in so many nobody has come to. */
const OFFICE_EVERY = 5;
const FORGOTTEN_EVERY = 17;

/** Tells what was logged, what was said about it later, and the kinds of hours set to it. */
export function tellEntries(telling: Telling): void {
  for (const [index, entry] of DEMO_ENTRIES.entries()) {
    tellEntry(telling, entry);
    const isForgotten = index % FORGOTTEN_EVERY === FORGOTTEN_EVERY - 1;
    if (workdayAfter(entry.day) <= NEWEST_DAY_WITH_KINDS && !isForgotten)
      tellKinds(telling, entry, index % OFFICE_EVERY === 0 ? 'imelda' : 'orrin');
  }
  for (const change of DEMO_CHANGES)
    telling.say(change.by, change.day, change.time, (atMs) => changeOp(telling, change, atMs));
}

function tellEntry(telling: Telling, entry: DemoEntry): void {
  const entryId = telling.id(`entry/${nameOf(entry)}`);
  const { boat, stage } = (entry.key && FIRST_LOGGED[entry.key]) || entry;
  const data = {
    entryId,
    boatId: telling.id(boat),
    stageId: telling.id(`${boat}/${stage}`),
    workDate: telling.days.on(entry.about ?? entry.day),
    text: entry.text,
    spoken: false,
    hours: figures(telling, entry.hours),
  };
  telling.say(entry.author, entry.day, entry.time, () => ({ kind: 'entry.write', makes: entryId, data }));
}

function figures(telling: Telling, hours: Partial<Record<PersonKey, Figure>>) {
  return (Object.entries(hours) as [PersonKey, Figure][]).map(([key, figure]) => {
    const [count, kind] = typeof figure === 'number' ? [figure, undefined] : figure;
    return { personId: telling.person(key), minutes: count * 60, ...(kind ? { kind } : {}) };
  });
}

/** Kinds are set two days later, to the hours as they then stand. */
function tellKinds(telling: Telling, entry: DemoEntry, by: PersonKey): void {
  const entryId = telling.id(`entry/${nameOf(entry)}`);
  const corrected = DEMO_CHANGES.find((change) => change.key === nameOf(entry) && 'hours' in change.does);
  const latest = corrected && 'hours' in corrected.does ? corrected.does.hours : {};
  const hours = figures(telling, { ...latest, ...entry.hours }).map((figure) => {
    const later = figures(telling, latest).find((one) => one.personId === figure.personId);
    return { ...figure, minutes: later?.minutes ?? figure.minutes, kind: figure.kind ?? 'agreed' };
  });
  telling.say(by, workdayAfter(entry.day) + KINDS_SET_AFTER_DAYS, by === 'orrin' ? '17:10' : '14:00', () => ({
    kind: 'entry.amend',
    data: { entryId, set: { hours } },
    sets: { rowId: entryId, fields: hours.map((figure) => `hours/${figure.personId}`) },
  }));
}

function changeOp(telling: Telling, { key, does }: DemoChange, atMs: number): SaidOp {
  const entryId = telling.id(`entry/${key}`);
  if ('adds' in does)
    return { kind: 'entry.addTo', data: { entryId, additionId: telling.ids.next(atMs), text: does.adds } };
  if ('strikes' in does) {
    const data = { entryId, why: does.strikes, saw: [telling.script.makerOf(entryId)] };
    return { kind: 'entry.strike', data, sets: { rowId: entryId, fields: ['struck'] } };
  }
  if ('movesTo' in does) {
    const { boat, stage } = does.movesTo;
    const set = { boatId: telling.id(boat), stageId: telling.id(`${boat}/${stage}`) };
    const data = { entryId, set, why: does.why };
    return { kind: 'entry.amend', data, sets: { rowId: entryId, fields: ['stageId'] } };
  }
  const hours = figures(telling, does.hours).map((figure) => ({ ...figure, kind: null }));
  const fields = hours.map((figure) => `hours/${figure.personId}`);
  const data = { entryId, set: { hours }, why: does.why };
  return {
    kind: 'entry.amend',
    data,
    sets: { rowId: entryId, fields },
    ...(does.isUnheard ? { isUnheard: true } : {}),
  };
}
