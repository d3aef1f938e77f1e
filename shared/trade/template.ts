import { z } from 'zod';
import { gateSchema } from './gate.ts';

const idSchema = z.string().regex(/^[a-z0-9_]+$/);
const wordsSchema = z.string().trim().min(1).max(500);

/** Files give hours, as the trade estimates; the product counts whole minutes. */
const hoursSchema = z
  .number()
  .positive()
  .max(1000)
  .transform((hours) => Math.round(hours * 60));

/** What a shop or an owner decides, and what is left out where the answer is no or not yet given. */
export const choiceSchema = z.enum(['bottom_scope', 'bleach', 'turn_over']);
export type Choice = z.infer<typeof choiceSchema>;

/**
 * How a task becomes several: `side` two, port and starboard; `rib` and `plank` one for each; `place` and `finding`
 * one for each place named, when the boat's list is made or later. `tenFeet` is one task whose estimate is for ten
 * feet of the boat's length; `estimateRange` one whose estimate has a low and a high figure.
 */
export const perSchema = z.enum(['side', 'rib', 'plank', 'place', 'finding', 'tenFeet', 'estimateRange']);
export type Per = z.infer<typeof perSchema>;

const MADE_EACH: readonly (Per | undefined)[] = ['side', 'rib', 'plank', 'place', 'finding'];

/** Whether the task is made once for each thing that it is `per`. */
export function isMadeEach(task: { per?: Per | undefined }): boolean {
  return MADE_EACH.includes(task.per);
}

const taskFileSchema = z
  .strictObject({
    id: idSchema,
    title: wordsSchema,
    /** for one boat in fair condition, or for one of what the task is `per`; common practice, no source */
    hours: hoursSchema,
    per: perSchema.optional(),
    /** the title of one of several; `{which}` stands for 'port', '9', '3 of 12' or the place's words */
    each: wordsSchema.refine((text) => text.includes('{which}'), 'says {which}').optional(),
    choice: choiceSchema.optional(),
    /** how the boat lies once it is done */
    lies: z.enum(['upright', 'upside-down']).optional(),
    /** the one part that the task is about, where it is about one */
    part: idSchema.optional(),
    side: z.enum(['centre', 'both']).optional(),
    gates: z.array(gateSchema).default([]),
    cautions: z.array(idSchema).default([]),
  })
  .refine(
    (task) => isMadeEach(task) === (task.each !== undefined),
    'has a title for each exactly where it is made for each',
  )
  .transform(({ hours, ...task }) => ({ ...task, estimateMinutes: hours }));

/** Shortest and longest, in minutes; common practice, no source: the label always wins. */
const waitSchema = z
  .strictObject({
    kind: idSchema,
    part: idSchema,
    hours: z.tuple([hoursSchema, hoursSchema]),
    endsWhen: wordsSchema,
    note: wordsSchema.optional(),
  })
  .transform(({ hours, ...wait }) => ({ ...wait, typicalMinutes: hours }));

const stageFileSchema = z.strictObject({
  id: idSchema,
  name: wordsSchema,
  covers: wordsSchema,
  /** the stages that come before; one left out counts as finished */
  after: z.array(idSchema),
  choice: choiceSchema.optional(),
  orderNote: wordsSchema.optional(),
  gates: z.array(gateSchema),
  tasks: z.array(taskFileSchema),
  waits: z.array(waitSchema),
});

/** A stage template as its file holds it, in minutes; cautions are ids of the rules' cautions. */
export const templateFileSchema = z.strictObject({
  id: idSchema,
  name: wordsSchema,
  note: z.string().min(1).max(1000),
  stages: z.array(stageFileSchema).min(1),
});
export type TemplateFile = z.infer<typeof templateFileSchema>;
export type StageTemplate = TemplateFile['stages'][number];
export type TaskTemplate = StageTemplate['tasks'][number];
