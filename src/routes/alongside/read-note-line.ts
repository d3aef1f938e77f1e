import type { FindingRow } from '#shared/finding/finding.ts';
import type { SoundRow } from '#shared/sound/sound.ts';
import type { Bung } from '#src/components/bung-mark.tsx';
import type { View } from '#src/replica/view.ts';
import { readEnds, type EndLine } from '#src/routes/alongside/read-ends.ts';
import { markOf, struckWords } from '#src/routes/alongside/read-mark.ts';
import { readPhoto, type PhotoLine, type PhotosByOwner } from '#src/routes/alongside/read-photos.ts';
import { timeWords } from '#src/words/day-words.ts';
import {
  CERTAINTY_WORDS,
  extentWords,
  findingTitle,
  KNOWN_WORDS,
  soundTitle,
} from '#src/words/finding-words.ts';
import { unitsOf } from '#src/words/units.ts';
import { whoWords } from '#src/words/who.ts';

/** A finding, or what was found sound, as a row of the line shows it. */
export interface NoteLine {
  entity: 'finding' | 'sound';
  id: string;
  mark: Bung;
  isHeld: boolean;
  time: string;
  author: string;
  /** 'Rot, deck beam 4 port' */
  title: string;
  /** 'proved, opened up', '11 in long; feared 24 in long' */
  facts: string[];
  words: string;
  photos: PhotoLine[];
  struck: string | null;
  ends: EndLine[];
}

/** A finding as this person's device knows it. */
export function readFinding(view: View, row: FindingRow, photos: PhotosByOwner): NoteLine {
  return {
    ...readNote(view, 'finding', row),
    title: findingTitle(row),
    facts: [`${CERTAINTY_WORDS[row.certainty]}, ${KNOWN_WORDS[row.known]}`, ...sizeFacts(view, row)],
    words: row.text,
    photos: (photos.ofFinding.get(row.id) ?? []).map((photo) => readPhoto(view, photo)),
  };
}

/** What was found sound, as this person's device knows it. */
export function readSound(view: View, row: SoundRow): NoteLine {
  return {
    ...readNote(view, 'sound', row),
    title: soundTitle(row),
    facts: [KNOWN_WORDS[row.known]],
    words: row.text ?? '',
    photos: [],
  };
}

function readNote(view: View, entity: 'finding' | 'sound', row: FindingRow | SoundRow) {
  const ends = readEnds(view, entity, row);
  const isHeld = view.isHeld(entity, row.id);
  return {
    entity,
    id: row.id,
    mark: markOf(row, ends, isHeld),
    isHeld,
    time: timeWords(row.notedAt, view.timeZone),
    author: whoWords(view, row.authorId),
    struck: struckWords(view, row),
    ends,
  };
}

function sizeFacts(view: View, { seenExtent, fearedExtent, openToKnow }: FindingRow): string[] {
  const units = unitsOf(view);
  const [seen, feared] = [extentWords(seenExtent, units), extentWords(fearedExtent, units)];
  return [seen, feared && `feared ${feared}`, openToKnow && 'only opening will tell'].filter(
    (fact): fact is string => Boolean(fact),
  );
}
