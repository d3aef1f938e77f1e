import type { z } from 'zod';
import type { Role } from '#shared/identity/role.ts';

export type Answer = { description: string; schema?: z.ZodType; contentType?: string };

/** One method at one path, declared beside its route; `/api/boats/:id` style parameters are read from the path. */
export type Operation = {
  method: 'get' | 'head' | 'post' | 'put' | 'patch' | 'delete';
  path: string;
  summary: string;
  /** who may ask: anyone at all, whoever is signed in, or these roles */
  roles: 'anyone' | 'signed-in' | readonly Role[];
  query?: z.ZodObject;
  body?: z.ZodType;
  /** default application/json */
  bodyType?: string;
  /** problem answers (RFC 9457) need no schema: they are filled in for 4xx and 5xx without one */
  responses: Record<number, Answer>;
};
