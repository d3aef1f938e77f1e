import { Link } from 'react-router-dom';
import { BungMark } from '#src/components/bung-mark.tsx';
import { Hours } from '#src/components/hours.tsx';
import { Icon } from '#src/components/icons.tsx';
import { KeyLink } from '#src/components/key.tsx';
import { useMe } from '#src/replica/hooks.tsx';
import { EntryRow } from './entry-row.tsx';
import { BATTEN_LOOK, RUNS_ON } from './batten-look.ts';
import type { DaySheet, PersonOnSheet, TickLine } from './read-day-sheet.ts';
import { Notes } from './notes.tsx';
import type { AloneOnSheet } from './read-notes.ts';
import type { Heard } from './read-heard.ts';

interface PeopleListProps {
  sheet: DaySheet;
  /** Null where this person may not divide entries. */
  onSplit: ((entryId: string) => void) | null;
}

/** A day by person: who logged, then who has not. */
export function PeopleList({ sheet, onSplit }: PeopleListProps) {
  return (
    <section aria-label="By person">
      <ul className="grid grid-cols-[minmax(0,1fr)] gap-seam bg-line py-seam">
        {sheet.people.map((person) => (
          <PersonBlock key={person.personId} person={person} sheet={sheet} onSplit={onSplit} />
        ))}
      </ul>
    </section>
  );
}

function PersonBlock({ person, sheet, onSplit }: PeopleListProps & { person: PersonOnSheet }) {
  return (
    <li className="grid grid-cols-[minmax(0,1fr)_auto] bg-plank px-4 pt-3 pb-2 lg:grid-cols-[152px_minmax(0,1fr)_64px] lg:px-5">
      <div className="min-w-0 pb-1">
        <h2 className="text-[20px] leading-[1.3] font-bold break-words">{person.name}</h2>
        <HeardLine heard={person.heard} />
      </div>
      <Total person={person} />
      <div className="col-span-2 min-w-0 lg:col-span-1 lg:col-start-2 lg:row-start-1">
        <ul className={`${BATTEN_LOOK} ${RUNS_ON}`}>
          {person.entries.map((entry) => (
            <EntryRow key={entry.id} entry={entry} personName={person.name} onSplit={onSplit} />
          ))}
          {person.alone.map((own) => (
            <AloneRow key={own.boatId} own={own} />
          ))}
          {person.ticks.map((tick) => (
            <TickRow key={tick.key} tick={tick} />
          ))}
        </ul>
        {person.nothing && <NothingYet person={person} day={sheet.day} />}
        {person.gaps.map((words) => (
          <p key={words} className="my-2 flex gap-2 border-l-[9px] border-redlead pl-3 font-semibold">
            <Icon name="warning" className="mt-[1px]" />
            {words}
          </p>
        ))}
      </div>
    </li>
  );
}

/** What somebody noted or photographed on a boat by itself. */
function AloneRow({ own }: { own: AloneOnSheet }) {
  const mark = own.notes.find((note) => note.mark !== 'sent')?.mark ?? 'sent';
  return (
    <li className="relative py-[5px] pl-[44px]">
      <span className="absolute top-[6px] left-[1px] z-20">
        <BungMark mark={mark} />
      </span>
      <Link to={`/order/${own.boatId}`} className="font-bold text-mahogany hover:underline">
        {own.boatName}
      </Link>
      <Notes notes={own.notes} photos={own.photos} />
    </li>
  );
}

function HeardLine({ heard }: { heard: Heard }) {
  return (
    <div className="text-[16px] leading-snug">
      {heard.holding.map((words) => (
        <p key={words} className="my-[2px] w-fit border-2 border-on-seam bg-seam px-2 text-on-seam">
          {words}
        </p>
      ))}
      {heard.words && <p className="text-slate">{heard.words}</p>}
    </div>
  );
}

function Total({ person }: { person: PersonOnSheet }) {
  const isUnsure = person.nothing !== null && !person.nothing.isSure;
  return (
    <p
      className={`text-right text-[26px] leading-tight font-bold lg:col-start-3 ${person.minutes === 0 ? 'text-slate' : ''}`}
    >
      <span className="sr-only">Hours of {person.name}: </span>
      {isUnsure ? (
        <>
          <span aria-hidden="true">?</span>
          <span className="sr-only">not known</span>
        </>
      ) : (
        <Hours minutes={person.minutes} unit="" />
      )}
      {person.minutes < person.usualMinutes && (
        <span className="block text-[16px] leading-snug font-normal whitespace-nowrap text-slate">
          of <Hours minutes={person.usualMinutes} />
        </span>
      )}
    </p>
  );
}

function TickRow({ tick }: { tick: TickLine }) {
  return (
    <li className="relative py-[5px] pl-[44px]">
      <span className="absolute top-[6px] left-[1px] z-20 flex size-[26px] items-center justify-center rounded-full border-2 border-bilge bg-plank">
        <Icon name="tick" size={18} />
      </span>
      <span className="sr-only">Ticked off: </span>
      {tick.title} <span className="text-slate">· {tick.boatName}</span>
      {tick.twice && (
        <strong className="ml-2 border-2 border-bilge px-[6px] whitespace-nowrap">{tick.twice}</strong>
      )}
    </li>
  );
}

function NothingYet({ person, day }: { person: PersonOnSheet; day: string }) {
  const isForeman = useMe()?.roles.includes('foreman') ?? false;
  return (
    <div className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2 pb-1 lg:pl-[44px]">
      <p className="min-w-[min(14em,100%)] flex-1 text-slate">{person.nothing!.words}</p>
      {isForeman && !person.isMe && (
        <div data-keys>
          <KeyLink to={`/log?for=${person.personId}&day=${day}`}>Log for {person.name}</KeyLink>
        </div>
      )}
    </div>
  );
}
