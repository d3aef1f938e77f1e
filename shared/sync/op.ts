import { z } from 'zod';
import { idSchema, isUuidV7, newIdSchema } from './ids.ts';
import { parseStamp, stampSchema } from './stamp.ts';

/** The longest text an op may carry, in UTF-16 units. */
export const TEXT_UNITS_MAX = 20_000;

/** The values that a change replaces: for each field the ops that set them. */
export const overSchema = z.record(z.string().max(100), z.array(idSchema).max(1000));

const opShape = {
  id: newIdSchema,
  v: z.int().min(1).default(1),
  kind: z.string().max(100),
  at: stampSchema,
  personId: idSchema,
  over: overSchema.default({}),
  data: z.record(z.string(), z.unknown()),
};

/** Reads the fields of an op that are known here and leaves others in it: see `hasUnknownField`. */
export const opSchema = z.looseObject(opShape);

/** What a person did, as sent: small, named, immutable. */
export type Op<Data = Record<string, unknown>> = Omit<z.infer<z.ZodObject<typeof opShape>>, 'data'> & { data: Data };

/** Whether an op says something beside its data that only a newer version understands. */
export function hasUnknownField(op: Op<unknown>): boolean {
  return Object.keys(op).some((field) => !Object.hasOwn(opShape, field));
}

export const reasonSchema = z.enum([
  'malformed',
  'not-understood',
  'id-reused',
  'not-entitled',
  'no-such-row',
  'device-revoked',
  'server-fault',
]);

/** Why an op was set aside. */
export type Reason = z.infer<typeof reasonSchema>;

const LONE_SURROGATE = /\p{Surrogate}/u;

/** Whether every text in a JSON value can be kept: not too long, no U+0000, no lone surrogate. */
export function isKeepableText(value: unknown): boolean {
  if (typeof value === 'string') {
    return value.length <= TEXT_UNITS_MAX && !value.includes('\u0000') && !LONE_SURROGATE.test(value);
  }
  if (Array.isArray(value)) return value.every(isKeepableText);
  if (typeof value === 'object' && value !== null) {
    return Object.entries(value).every(([key, inner]) => isKeepableText(key) && isKeepableText(inner));
  }
  return true;
}

export type ReadOp = { op: Op } | { op: null; id: string | null; at: string | null };

/**
 * What came as an op, or, where it cannot be read as one made on `deviceId`, the little that can be made out:
 * its id if that is a UUIDv7, its stamp if that is this device's.
 */
export function readOp(raw: unknown, deviceId: string): ReadOp {
  const parsed = opSchema.safeParse(raw);
  if (parsed.success && parseStamp(parsed.data.at)!.deviceId === deviceId && isKeepableText(raw)) return { op: parsed.data };
  const loose = (typeof raw === 'object' && raw !== null ? raw : {}) as { id?: unknown; at?: unknown };
  const stamp = parseStamp(loose.at);
  return {
    op: null,
    id: isUuidV7(loose.id) ? loose.id : null,
    at: stamp?.deviceId === deviceId ? (loose.at as string) : null,
  };
}
