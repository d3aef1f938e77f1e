import { z } from 'zod';

const wordsSchema = z.string().trim().min(1).max(500);
const partSchema = z.string().regex(/^[a-z_]+$/);
const percentSchema = z.number().min(0).max(100);

/** Figures that carry no source of their own. */
export const NO_SOURCE = 'common practice, no source';

const everyGateShape = {
  text: wordsSchema,
  reason: wordsSchema,
  /** stop: warns hard and is passed with a named reason; warn: a notice, no reason asked */
  strength: z.enum(['stop', 'warn']),
  /** it stands before the start of its stage or task, unless at its close */
  at: z.literal('close').optional(),
  note: wordsSchema.optional(),
};

const figureShape = { ...everyGateShape, source: wordsSchema.default(NO_SOURCE) };

/** What has to be so before a stage or a task starts, or before a stage closes. */
export const gateSchema = z.discriminatedUnion('type', [
  z.strictObject({
    ...figureShape,
    /**
     * The latest reading on the part is at or below `percent` and not older than 48 h; with `agreeing`, the last so
     * many at the same mark, 20 h or more apart, are, and differ by one point at most.
     */
    type: z.literal('moisture_max'),
    percent: percentSchema,
    part: partSchema,
    agreeing: z.int().min(2).optional(),
  }),
  z.strictObject({
    ...figureShape,
    /** the latest reading on the part, or on the stock to be hung, lies within `min` and `max` percent, not older than 48 h */
    type: z.literal('moisture_range'),
    min: percentSchema,
    max: percentSchema,
    part: partSchema,
  }),
  z.strictObject({
    ...figureShape,
    /** The room's last reading is in limits; with `surface` that is read too, before each coat. Relative humidity in percent, degrees Fahrenheit. */
    type: z.literal('climate'),
    rhMax: percentSchema.optional(),
    tempMinF: z.number().optional(),
    /** how far above the dew point the surface has to be */
    dewMarginF: z.number().optional(),
    surface: z.boolean().optional(),
  }),
  /** no wait of that kind is open on the part; `any` means every kind */
  z.strictObject({ ...everyGateShape, type: z.literal('wait_ended'), wait: z.string().regex(/^[a-z_]+$/) }),
  /** the task of the same template is ticked off */
  z.strictObject({ ...everyGateShape, type: z.literal('task_done'), task: z.string() }),
  /** at least one photo of that set has part and side */
  z.strictObject({
    ...everyGateShape,
    type: z.literal('photo_set'),
    set: z.enum(['arrival', 'before', 'after', 'before-closing', 'mark']),
  }),
  /** an answer is on record */
  z.strictObject({ ...everyGateShape, type: z.literal('owner_decision'), decision: z.string() }),
  /** a result is on record */
  z.strictObject({ ...everyGateShape, type: z.literal('test_done'), test: z.string() }),
  z.strictObject({
    ...everyGateShape,
    /** opened and signed; a safety gate is passed only by the foreman's reason and a second person's confirmation */
    type: z.literal('checklist'),
    checklist: z.string(),
    signedBy: z.literal('foreman').optional(),
    safety: z.literal(true).optional(),
    /** it counts only while that stage is started and what closes her up again is not finished */
    when: z.strictObject({ open: z.string() }).optional(),
  }),
  /** every finding on the parts has its disposition, none waits for an answer, and mending chosen for before is done */
  z.strictObject({ ...everyGateShape, type: z.literal('findings_settled') }),
]);
export type Gate = z.infer<typeof gateSchema>;
