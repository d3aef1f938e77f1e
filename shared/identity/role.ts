import { z } from 'zod';

export const roleSchema = z.enum(['crew', 'foreman', 'office', 'owner']);
export type Role = z.infer<typeof roleSchema>;
