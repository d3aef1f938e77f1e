import { CheckKey } from '#src/components/check-key.tsx';
import { QuarterHours } from '#src/components/quarter-hours.tsx';
import { Notice } from '#src/components/notice.tsx';
import type { DraftFields } from '#src/routes/alongside/log/entry-draft.ts';
import type { LogForm } from '#src/routes/alongside/log/read-log.ts';

interface AlongFieldsProps extends DraftFields {
  people: LogForm['people'];
  problem: string | undefined;
}

/** Who worked along, each with hours that follow one's own until they are changed. */
export function AlongFields({ draft, change, people, problem }: AlongFieldsProps) {
  const { along } = draft;
  const isAlong = (personId: string) => along.some((each) => each.personId === personId);

  function setAlong(personId: string, isIn: boolean) {
    const others = along.filter((each) => each.personId !== personId);
    change({ along: isIn ? [...others, { personId, minutes: null }] : others });
  }

  function setMinutes(personId: string, minutes: number | null) {
    change({ along: along.map((each) => (each.personId === personId ? { personId, minutes } : each)) });
  }

  if (people.length === 0) return null;
  return (
    <fieldset className="grid gap-3">
      <legend className="pb-1 text-[18px] font-semibold">Who worked along?</legend>
      <div className="grid grid-cols-2 gap-3 md:grid-cols-3">
        {people.map(({ id, name }) => (
          <CheckKey
            key={id}
            label={name}
            isChecked={isAlong(id)}
            onChange={(isChecked) => setAlong(id, isChecked)}
          />
        ))}
      </div>
      {problem && <Notice tone="error">{problem}</Notice>}
      {people
        .filter(({ id }) => isAlong(id))
        .map(({ id, name }) => (
          <QuarterHours
            key={id}
            label={`${name}'s hours`}
            minutes={along.find(({ personId }) => personId === id)?.minutes ?? draft.minutes}
            onChange={(minutes) => setMinutes(id, minutes)}
            isShort
          />
        ))}
    </fieldset>
  );
}
