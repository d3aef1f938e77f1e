import { noteKinds } from '../entry/note-kinds.ts';
import { soundNoteSchema, soundSetSchema, type SoundNote, type SoundSet } from './sound.ts';

export const soundKinds = noteKinds<SoundNote, SoundSet>({
  entity: 'sound',
  verb: 'note',
  data: soundNoteSchema,
  set: soundSetSchema,
});
