import type { PhotoSet } from '#shared/photo/photo.ts';

/** The sets that a photograph can belong to. */
export const PHOTO_SET_WORDS: Record<PhotoSet, string> = {
  arrival: 'arrival',
  before: 'before',
  after: 'after',
  'before-closing': 'before closing',
  mark: 'a mark',
};
