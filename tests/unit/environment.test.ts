import path from 'node:path';
import { expect, test } from 'vitest';
import { readEnvironment } from '#server/launch/environment.ts';

test('nothing set, or set to nothing, means the defaults', () => {
  const defaults = {
    port: 5180,
    host: '127.0.0.1',
    databaseUrl: null,
    dataDir: path.resolve('.ribband'),
    isDemoWanted: true,
  };
  expect(readEnvironment({})).toEqual(defaults);
  expect(readEnvironment({ PORT: '', DATABASE_URL: '', RIBBAND_DEMO: '' })).toEqual(defaults);
});

test('what is set is taken', () => {
  const read = readEnvironment({
    PORT: '80',
    HOST: '::',
    DATABASE_URL: 'postgres://a@b/c',
    RIBBAND_DEMO: '0',
  });
  expect(read).toMatchObject({ port: 80, host: '::', databaseUrl: 'postgres://a@b/c', isDemoWanted: false });
});

test('every bad variable is named at once', () => {
  const read = () => readEnvironment({ PORT: '70000', DATABASE_URL: 'mysql://a', RIBBAND_DEMO: 'yes' });
  expect(read).toThrow(
    /PORT: .*\n.*DATABASE_URL: must begin with postgres:\/\/\n.*RIBBAND_DEMO: must be 0 or 1/,
  );
});
