import { Key, KeyLink } from '#src/components/key.tsx';
import type { Change } from '#src/routes/alongside/entry/change-sheets.tsx';
import type { EntryActions, EntryPage } from '#src/routes/alongside/entry/read-entry-page.ts';

interface EntryKeysProps {
  page: EntryPage;
  onChoose: (change: Change) => void;
}

const KEYS: { change: Change; word: string; isOffered: (actions: EntryActions) => boolean }[] = [
  { change: 'addTo', word: 'Add to it', isOffered: ({ addTo }) => addTo },
  { change: 'words', word: 'Change the words', isOffered: ({ words }) => words },
  {
    change: 'hours',
    word: 'Change the hours',
    isOffered: ({ hoursOf, hoursOfAnybody }) => hoursOf.length > 0 || hoursOfAnybody,
  },
  { change: 'day', word: 'Change the day', isOffered: ({ day }) => day },
  { change: 'move', word: 'Other boat or stage', isOffered: ({ move }) => move },
  { change: 'restore', word: 'Bring it back', isOffered: ({ restore }) => restore },
];

/** What this person may do with the entry, as keys; what they may not, in words. */
export function EntryKeys({ page, onChoose }: EntryKeysProps) {
  const { actions, refusal } = page;
  return (
    <div className="grid gap-3 px-4 py-5 md:px-6">
      <div className="grid gap-3 min-[360px]:grid-cols-2">
        {KEYS.filter(({ isOffered }) => isOffered(actions)).map(({ change, word }) => (
          <Key key={change} onClick={() => onChoose(change)}>
            {word}
          </Key>
        ))}
        {actions.addNotes && (
          <>
            <KeyLink to={`/photos?entry=${page.row.id}`} icon="photo">
              Photo
            </KeyLink>
            <KeyLink to={`/found?entry=${page.row.id}`} icon="found">
              Found
            </KeyLink>
          </>
        )}
        {actions.strike && (
          <Key kind="danger" onClick={() => onChoose('strike')}>
            Strike it
          </Key>
        )}
      </div>
      {refusal && <p className="text-slate">{refusal}</p>}
    </div>
  );
}
