import { noteKinds } from '../entry/note-kinds.ts';
import { findingNoteSchema, findingSetSchema, type FindingNote, type FindingSet } from './finding.ts';

export const findingKinds = noteKinds<FindingNote, FindingSet>({
  entity: 'finding',
  verb: 'note',
  data: findingNoteSchema,
  set: findingSetSchema,
});
