import path from 'node:path';
import { z } from 'zod';
import { LaunchFailure } from './failure.ts';

const PORT_MAX = 65535;

const postgresUrl = z.string().regex(/^postgres(ql)?:\/\/\S+$/, 'must begin with postgres://');

const environmentSchema = z
  .object({
    PORT: z.coerce.number('must be a number').int().min(0).max(PORT_MAX).default(5180),
    HOST: z.string().default('127.0.0.1'),
    DATABASE_URL: postgresUrl.optional(),
    RIBBAND_DATA: z.string().default('./.ribband'),
    RIBBAND_DEMO: z.enum(['0', '1'], 'must be 0 or 1').default('1'),
  })
  .transform((read) => ({
    port: read.PORT,
    host: read.HOST,
    /** null: run a cluster of our own */
    databaseUrl: read.DATABASE_URL ?? null,
    dataDir: path.resolve(read.RIBBAND_DATA),
    isDemoWanted: read.RIBBAND_DEMO === '1',
  }));

export type Environment = z.infer<typeof environmentSchema>;

/** What the environment asks for; an empty variable counts as absent. Throws a LaunchFailure naming each bad one. */
export function readEnvironment(variables: NodeJS.ProcessEnv): Environment {
  const given = Object.fromEntries(Object.entries(variables).filter(([, value]) => value !== ''));
  const read = environmentSchema.safeParse(given);
  if (read.success) return read.data;
  const lines = read.error.issues.map(({ path, message }) => `  ${path.join('.')}: ${message}`);
  throw new LaunchFailure(['The environment cannot be read:', ...lines].join('\n'));
}
