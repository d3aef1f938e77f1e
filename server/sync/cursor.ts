import { z } from 'zod';
import { idSchema } from '#shared/sync/ids.ts';

/** How far a person's replica has come in a shop's feed. */
export interface Cursor {
  /** which life of the shop's database the number belongs to */
  incarnation: string;
  personId: string;
  /** the person's feed epoch: roles and boats as they were */
  epoch: number;
  seq: number;
}

const count = z.int().min(0);
const partsSchema = z.tuple([idSchema, idSchema, count, count]);

export function writeCursor({ incarnation, personId, epoch, seq }: Cursor): string {
  return Buffer.from(JSON.stringify([incarnation, personId, epoch, seq])).toString('base64url');
}

/** The cursor that the text says, or null where it is none. */
export function readCursor(text: string): Cursor | null {
  const parts = partsSchema.safeParse(parsed(Buffer.from(text, 'base64url').toString()));
  if (!parts.success) return null;
  const [incarnation, personId, epoch, seq] = parts.data;
  return { incarnation, personId, epoch, seq };
}

function parsed(json: string): unknown {
  try {
    return JSON.parse(json);
  } catch {
    return null;
  }
}
