import { z } from 'zod';
import { gateSchema } from './gate.ts';

/** Two lines of the smallest phone (360 px) in 18 px type. */
export const CAUTION_BRIEF_CHARS_MAX = 72;

export const cautionSchema = z.strictObject({
  id: z.string().regex(/^[a-z_]+$/),
  /** for the task's first screen: two lines at most, the deferral to label, local code or licensed practice in them */
  brief: z.string().min(1).max(CAUTION_BRIEF_CHARS_MAX),
  /** shown when asked for, under the safety note */
  text: z.string().min(1).max(180),
});
/** A short reminder, never an instruction. */
export type Caution = z.infer<typeof cautionSchema>;

export const rulesSchema = z.strictObject({
  /** stands above every list of cautions: who decides */
  safetyNote: z.string().min(1),
  cautions: z.array(cautionSchema),
  /** asked when any stage of any template is marked finished */
  closingGates: z.array(gateSchema),
  checklists: z.record(z.string(), z.array(z.string().min(1)).min(1)),
  /** what shops do not agree on: figures and orders in the templates that are starting points */
  doubtful: z.array(z.string().min(1)),
});
/** What holds for every template. */
export type Rules = z.infer<typeof rulesSchema>;
