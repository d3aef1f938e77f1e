import { Link } from 'react-router-dom';
import { BungMark } from '#src/components/bung-mark.tsx';
import { Empty } from '#src/components/empty.tsx';
import { Hours } from '#src/components/hours.tsx';
import { Icon } from '#src/components/icons.tsx';
import { counted } from '#src/words/day-words.ts';
import { HOURS_KIND_SHORT_WORDS } from '#src/words/hours-words.ts';
import { BATTEN_LOOK } from './batten-look.ts';
import type { BoatOnSheet, BriefEntry, StageOnSheet } from './read-boats.ts';

/** A day by boat: every entry in one line under its stage, so that the whole day is one look. */
export function BoatsList({ boats }: { boats: BoatOnSheet[] }) {
  if (boats.length === 0) return <Empty>Nothing about any boat yet.</Empty>;
  return (
    <section aria-label="By boat">
      <p className="hidden px-4 pt-4 pb-1 text-[20px] font-bold print:block">By boat</p>
      <ul className="grid grid-cols-[minmax(0,1fr)] gap-seam bg-line py-seam">
        {boats.map((boat) => (
          <BoatBlock key={boat.boatId} boat={boat} />
        ))}
      </ul>
    </section>
  );
}

function BoatBlock({ boat }: { boat: BoatOnSheet }) {
  return (
    <li className="bg-plank px-4 py-3 lg:px-5">
      <div className="flex items-baseline justify-between gap-4">
        <h2 className="text-[22px] leading-tight font-bold">
          <Link to={`/boats/${boat.boatId}`} className="text-mahogany hover:underline">
            {boat.name}
          </Link>
          {boat.dayOfStay !== null && (
            <span className="pl-2 text-[16px] font-semibold text-slate">day {boat.dayOfStay}</span>
          )}
        </h2>
        <p className="text-[26px] leading-tight font-bold">
          <span className="sr-only">Hours: </span>
          <Hours minutes={boat.minutes} unit="" />
        </p>
      </div>
      <div className={BATTEN_LOOK}>
        {boat.stages.map((stage) => (
          <StageBlock key={stage.stageId ?? ''} stage={stage} />
        ))}
      </div>
      {boat.ticks.length > 0 && (
        <p className="flex gap-2 pl-[2px]">
          <Icon name="tick" className="mt-[1px]" />
          <span className="min-w-0">{boat.ticks.join(' · ')}</span>
        </p>
      )}
      {boat.found.map((title) => (
        <p key={title} className="pl-[44px] font-semibold">
          {title}
        </p>
      ))}
      {boat.photoCount > 0 && (
        <p className="pl-[44px] text-slate">{counted(boat.photoCount, 'photo')} by themselves</p>
      )}
      {boat.finished.map((name) => (
        <p key={name} className="font-bold">
          {name}: finished
        </p>
      ))}
    </li>
  );
}

function StageBlock({ stage }: { stage: StageOnSheet }) {
  return (
    <div>
      <h3 className="relative pt-1 pl-[44px] text-[16px] leading-snug text-slate before:absolute before:top-[13px] before:left-[7px] before:h-[3px] before:w-[14px] before:bg-bilge">
        <span className="font-semibold text-bilge">{stage.name}</span> · <Hours minutes={stage.minutes} />
        {stage.kinds.map(({ kind, minutes }) => (
          <span key={kind ?? ''}>
            {' · '}
            {kind === null ? 'kind not set' : HOURS_KIND_SHORT_WORDS[kind]}{' '}
            <Hours minutes={minutes} unit="" />
          </span>
        ))}
      </h3>
      <ul>
        {stage.entries.map((entry) => (
          <BriefRow key={entry.id} entry={entry} />
        ))}
      </ul>
    </div>
  );
}

function BriefRow({ entry }: { entry: BriefEntry }) {
  return (
    <li className="relative flex items-center pl-[44px]">
      <span className="absolute left-[1px] z-20">
        <BungMark mark={entry.mark} />
      </span>
      <Link
        to={`/entry/${entry.id}`}
        className={`min-w-0 flex-1 truncate py-[10px] hover:underline print:py-[5px] print:whitespace-normal ${entry.mark === 'struck' ? 'text-slate line-through' : ''}`}
      >
        <People entry={entry} /> <span className="text-slate">·</span> <BriefNotes entry={entry} />
        {entry.text}
      </Link>
    </li>
  );
}

/** What was found stands before the words, which may be cut off. */
function BriefNotes({ entry: { found, photoCount } }: { entry: BriefEntry }) {
  return (
    <>
      {found.length > 0 && <strong>{found.join('; ')}. </strong>}
      {photoCount > 0 && <span className="text-slate">{counted(photoCount, 'photo')}. </span>}
    </>
  );
}

function People({ entry: { people, author } }: { entry: BriefEntry }) {
  if (people.length === 0) return <strong>{author}</strong>;
  return (
    <>
      {people.map(({ personId, name, minutes }, index) => (
        <span key={personId}>
          {index > 0 && ', '}
          <strong>{name}</strong> <Hours minutes={minutes} unit="" />
        </span>
      ))}
    </>
  );
}
