import { z } from 'zod';
import { isKeepableText } from '../sync/op.ts';

/** A name or a label: one short line that can be kept. */
export const nameSchema = z
  .string()
  .trim()
  .min(1)
  .max(200)
  .refine(isKeepableText, 'holds a character that cannot be kept');

/** In lower case, so that one address is one person however it is typed. */
export const emailSchema = z.string().trim().toLowerCase().max(254).pipe(z.email());

const PASSWORD_BYTES_MAX = 72;

/** A password to be set. bcrypt reads 72 bytes; a longer one is refused, not cut. */
export const newPasswordSchema = z
  .string()
  .min(8, 'at least 8 characters')
  .max(PASSWORD_BYTES_MAX, `at most ${PASSWORD_BYTES_MAX} bytes`)
  .refine(
    (text) => new TextEncoder().encode(text).length <= PASSWORD_BYTES_MAX,
    `at most ${PASSWORD_BYTES_MAX} bytes`,
  );
