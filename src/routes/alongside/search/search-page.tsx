import { useDeferredValue, useState } from 'react';
import { Link, useSearchParams } from 'react-router-dom';
import { BackBar } from '#src/components/back-bar.tsx';
import { Choice } from '#src/components/choice.tsx';
import { Empty } from '#src/components/empty.tsx';
import { Key } from '#src/components/key.tsx';
import { Page } from '#src/components/page.tsx';
import { PlainPlank } from '#src/components/plank.tsx';
import { Planks } from '#src/components/ribband.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { useRead, useReplica } from '#src/replica/hooks.tsx';
import { PLANK_LINK } from '#src/routes/alongside/plank-link.ts';
import { readSearch, type Hit } from '#src/routes/alongside/search/read-search.ts';
import { useWhere } from '#src/routes/alongside/use-where.ts';
import { counted } from '#src/words/day-words.ts';
import { deviceWord } from '#src/shell/device-words.ts';
import { RecordBar } from '#src/shell/record-bar.tsx';
import { boatWords } from '#src/words/where.ts';

const HITS_AT_FIRST = 50;

/** What this device carries, by words, by part and by number; what is asked stands in the address, so that going back finds it. */
export default function SearchPage() {
  const [where] = useWhere();
  const [search, setSearch] = useSearchParams();
  const asked = search.get('for') ?? '';
  const isAll = search.get('boats') === 'all' || where === null;
  const [hitsMax, setHitsMax] = useState(HITS_AT_FIRST);
  const boat = useRead(['search boat', where?.boatId], (view) =>
    where ? boatWords(view, where.boatId) : '',
  );

  function ask(next: { asked: string; isAll: boolean }) {
    setHitsMax(HITS_AT_FIRST);
    const params = { ...(next.asked ? { for: next.asked } : {}), ...(next.isAll ? { boats: 'all' } : {}) };
    setSearch(params, { replace: true });
  }

  return (
    <Page
      bars={
        <>
          <title>Search · Ribband</title>
          <BackBar isCoaming title="Search" to="/alongside" backWord="Back to Alongside" />
          <RecordBar />
        </>
      }
    >
      <form role="search" className="grid gap-4 p-4 md:p-6" onSubmit={(event) => event.preventDefault()}>
        <TextField
          label="Words, a part, a number"
          type="search"
          placeholder="floor 7 port"
          autoFocus
          autoComplete="off"
          enterKeyHint="search"
          value={asked}
          onChange={(text) => ask({ asked: text, isAll })}
        />
        {where && (
          <Choice
            label="Where to look"
            options={[
              { value: 'one', label: boat },
              { value: 'all', label: 'All boats' },
            ]}
            value={isAll ? 'all' : 'one'}
            onChange={(chosen) => ask({ asked, isAll: chosen === 'all' })}
            isRow
          />
        )}
      </form>
      <Answer
        asked={asked}
        boatId={isAll ? null : where.boatId}
        hitsMax={hitsMax}
        onMore={() => setHitsMax(hitsMax + HITS_AT_FIRST)}
      />
    </Page>
  );
}

interface AnswerProps {
  asked: string;
  boatId: string | null;
  hitsMax: number;
  onMore: () => void;
}

function Answer({ asked, boatId, hitsMax, onMore }: AnswerProps) {
  // typing never waits for the list
  const words = useDeferredValue(asked);
  const { hits, count } = useRead(['search', words, boatId, hitsMax], (view) =>
    readSearch(view, words, boatId, hitsMax),
  );
  if (words.trim() === '') {
    return (
      <Empty>
        Everything that this {deviceWord()} carries is looked through, with signal or without: entries,
        findings, what was found sound, photos, tasks and boats by any of their names.
      </Empty>
    );
  }
  return (
    <>
      <p role="status" className="px-4 pb-3 font-semibold md:px-6">
        {count === 0 ? `Nothing here has ‘${words.trim()}’.` : `${counted(count, 'thing')}, newest first`}
      </p>
      {count === 0 && boatId !== null && (
        <p className="px-4 text-slate md:px-6">Look on all boats, or with fewer words.</p>
      )}
      {hits.length > 0 && (
        <Planks>
          {hits.map((hit) => (
            <HitPlank key={`${hit.entity} ${hit.id}`} hit={hit} />
          ))}
        </Planks>
      )}
      {count > hits.length && (
        <div className="p-4">
          <Key className="w-full" onClick={onMore}>
            Show more ({count - hits.length})
          </Key>
        </div>
      )}
    </>
  );
}

function HitPlank({ hit }: { hit: Hit }) {
  const replica = useReplica();
  const isOfPlace = hit.entity === 'boat' || hit.entity === 'task';
  return (
    <PlainPlank>
      <div className="relative -mx-4 -my-[15px] px-4 py-[15px] md:-mx-6 md:px-6">
        <p className="text-slate">{hit.what}</p>
        <Link
          to={hit.to}
          className={`${PLANK_LINK} font-semibold ${hit.isStruck ? 'line-through' : ''}`}
          onClick={() => {
            if (isOfPlace) void replica.remember.write(hit.where);
          }}
        >
          {hit.title}
        </Link>
        {hit.isStruck && <p className="text-slate">Struck</p>}
        {hit.about && <p className="text-slate">{hit.about}</p>}
      </div>
    </PlainPlank>
  );
}
