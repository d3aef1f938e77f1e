import { z } from 'zod';

/** Where on the boat: beam 4; frames 6 to 9, port; 'two feet aft of the windshield'. Distances in millimetres. */
export const placeSchema = z.strictObject({
  partId: z.string().max(100).optional(),
  side: z.enum(['port', 'starboard', 'centre', 'both']).optional(),
  number: z.int().min(0).max(9999).optional(),
  toNumber: z.int().min(0).max(9999).optional(),
  stationMm: z.int().min(0).max(1_000_000).optional(),
  words: z.string().max(500).optional(),
});
export type Place = z.infer<typeof placeSchema>;
