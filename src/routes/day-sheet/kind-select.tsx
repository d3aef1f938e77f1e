import type { HoursKind } from '#shared/entry/hours.ts';
import { useHold, useMe } from '#src/replica/hooks.tsx';
import { HOURS_KINDS, HOURS_KIND_SHORT_WORDS } from '#src/words/hours-words.ts';
import type { Figure } from './read-entry.ts';

interface KindSelectProps {
  entryId: string;
  figure: Figure;
  personName: string;
}

/** The kind of one person's hours; foreman and office set it in place. What is only proposed asks to be said again. */
export function KindSelect({ entryId, figure, personName }: KindSelectProps) {
  const me = useMe();
  const { mutate: hold } = useHold();
  const { personId, minutes, kind, proposed } = figure;
  const isSet = kind !== null && !proposed;
  const unsetWords = kind === null ? 'kind?' : `${HOURS_KIND_SHORT_WORDS[kind]}?`;
  const maySet = me?.roles.some((role) => role === 'foreman' || role === 'office') ?? false;
  if (!maySet)
    return <p className="text-[16px] text-slate">{isSet ? HOURS_KIND_SHORT_WORDS[kind] : unsetWords}</p>;

  function set(chosen: HoursKind) {
    hold({ kind: 'entry.amend', data: { entryId, set: { hours: [{ personId, minutes, kind: chosen }] } } });
  }

  return (
    <select
      aria-label={`Kind of ${personName}'s hours`}
      title={isSet ? undefined : kind === null ? 'Nobody has said the kind' : 'Proposed; choose to set it'}
      className={`h-key w-[164px] max-w-full rounded-key border-2 bg-plank pl-2 text-[16px] text-ellipsis text-bilge sm:mt-[2px] sm:h-11 print:ml-auto print:block print:h-auto print:w-auto print:appearance-none print:pl-0 print:[text-align-last:right] print:border-0 print:font-normal ${isSet ? 'border-line' : 'border-bilge font-semibold'}`}
      value={isSet ? kind : ''}
      onChange={(event) => set(event.target.value as HoursKind)}
    >
      {!isSet && (
        <option value="" disabled>
          {unsetWords}
        </option>
      )}
      {HOURS_KINDS.map((each) => (
        <option key={each} value={each}>
          {HOURS_KIND_SHORT_WORDS[each]}
        </option>
      ))}
    </select>
  );
}
