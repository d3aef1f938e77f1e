import type { PhotoAttach } from '#shared/photo/photo.ts';

/** `thumb` is at most 480 px long, `view` what a screen shows whole, `full` what the phone sent. */
export type PictureSize = 'thumb' | 'view' | 'full';

/** A picture ready to be sent: upright, JPEG, without a word about where it was taken. */
export interface PreparedPicture {
  full: Blob;
  thumb: Blob;
  /** of `full`, as are the three that follow */
  sha256: string;
  width: number;
  height: number;
  bytes: number;
  /** ISO 8601, where the camera wrote it down */
  takenAt?: string;
}

/** A picture that this device keeps for a form, not yet part of the record: small enough for the form's draft. */
export interface KeptPicture extends Omit<PreparedPicture, 'full' | 'thumb'> {
  /** the id that its photo will have */
  photoId: string;
  /** what the file was called */
  name: string;
}

/** What a photo is of. */
export type PhotoAbout = Omit<PhotoAttach, 'photoId' | 'sha256' | 'takenAt' | 'width' | 'height' | 'bytes'>;

/** A picture that was not taken in, and why, in words. The others of the same pick are not held up by it. */
export interface FailedPicture {
  name: string;
  words: string;
}

/** How far a pick has come: `done` of `of` are settled, well or not. */
export interface PickProgress {
  done: number;
  of: number;
}

/** A picture of the record whose bytes this device has not brought to the server whole. */
export interface HeldPicture {
  sha256: string;
  name: string;
  /** ISO 8601 */
  since: string;
  /** 'thumb' once the server has the small picture; 'refused' where it wants none of it, with its words */
  state: 'waiting' | 'thumb' | 'refused';
  words?: string;
}

/** A file is no picture that can be sent; `message` says why, in words for the person. */
export class PictureError extends Error {
  override readonly name = 'PictureError';
}
