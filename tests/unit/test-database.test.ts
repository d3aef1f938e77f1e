import { expect, test } from 'vitest';
import { dropTestDatabase } from '#tests/worlds/postgres.ts';

test.each(['ribband', 'postgres', 'ribband_test', 'x; DROP DATABASE ribband'])(
  'a database named %s is left alone',
  async (name) => {
    await expect(dropTestDatabase(name)).rejects.toThrow('left alone');
  },
);
