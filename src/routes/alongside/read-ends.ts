import type { FollowerRow } from '#shared/entry/follow.ts';
import type { EntryRow } from '#shared/entry/entry.ts';
import type { LooseEnd } from '#shared/sync/loose-ends.ts';
import type { Row } from '#shared/sync/row.ts';
import type { View } from '#src/replica/view.ts';
import { fieldWords, readValue, type SaidValue } from '#src/words/said-words.ts';
import { momentWords } from '#src/words/day-words.ts';
import { whoWords } from '#src/words/who.ts';

/** What an entry's page, a finding's or a photo's is about. */
export type SaidEntity = 'entry' | 'finding' | 'sound' | 'photo';

export interface EndLine {
  id: string;
  kind: LooseEnd['kind'];
  field: string | null;
  about: string;
  values: (SaidValue & { opId: string; who: string; at: string; stands: boolean })[];
}

/** The loose ends of a row, each with the values that ask to stand. */
export function readEnds(view: View, entity: SaidEntity, row: EntryRow | FollowerRow): EndLine[] {
  return view.endsOf(entity, row).map((end) => ({
    id: end.id,
    kind: end.kind,
    field: end.field ?? null,
    about:
      end.kind === 'field'
        ? fieldWords(view, end.field!)
        : 'Struck, and changed since by somebody who did not know',
    values: end.values.map(({ value, personId, at, opId, stands }) => ({
      ...readEndValue(view, row, end, value),
      opId,
      who: whoWords(view, personId),
      at: momentWords(at, view.timeZone, view.today),
      stands,
    })),
  }));
}

/** A strike's loose end carries the field beside each value, or the id of what was added. */
function readEndValue(view: View, row: Row, end: LooseEnd, value: unknown): SaidValue {
  if (end.kind === 'field') return readValue(view, end.field!, value);
  const said = value as { field?: string; value?: unknown; added?: string };
  if (said.field !== undefined) return readValue(view, said.field, said.value);
  const additions = (row as Partial<EntryRow>).additions ?? [];
  return { words: additions.find(({ id }) => id === said.added)?.text ?? 'something added' };
}
