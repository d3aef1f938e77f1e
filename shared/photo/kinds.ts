import { noteKinds } from '../entry/note-kinds.ts';
import { photoAttachSchema, photoSetFieldsSchema, type PhotoAttach, type PhotoSetFields } from './photo.ts';

export const photoKinds = noteKinds<PhotoAttach, PhotoSetFields>({
  entity: 'photo',
  verb: 'attach',
  data: photoAttachSchema,
  set: photoSetFieldsSchema,
  atFirst: { arrived: null },
});
