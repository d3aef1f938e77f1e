import { defineConfig } from 'vitest/config';

const WORKERS_MAX = 2;
const databaseSetup = ['./tests/worlds/postgres-setup.ts'];

/** `setup: databaseSetup` gives a project the test PostgreSQL, started once for all the projects that want it. */
export default defineConfig({
  test: {
    maxWorkers: WORKERS_MAX,
    testTimeout: 10_000,
    hookTimeout: 30_000,
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          include: ['tests/unit/**/*.test.{ts,tsx}'],
          exclude: ['tests/unit/screens/**'],
        },
      },
      {
        extends: true,
        test: {
          name: 'screens',
          include: ['tests/unit/screens/**/*.test.{ts,tsx}'],
          environment: 'happy-dom',
        },
      },
      { extends: true, test: { name: 'checks', include: ['tests/checks/**/*.test.ts'] } },
      {
        extends: true,
        test: {
          name: 'api',
          include: ['tests/api/**/*.test.ts'],
          globalSetup: databaseSetup,
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'sim',
          include: ['tests/sim/**/*.test.ts'],
          globalSetup: databaseSetup,
          testTimeout: 300_000,
          hookTimeout: 60_000,
        },
      },
      {
        // browsers are heavy: one file at a time, after everything else
        extends: true,
        test: {
          name: 'e2e',
          include: ['tests/e2e/**/*.test.ts'],
          globalSetup: databaseSetup,
          fileParallelism: false,
          maxWorkers: 1,
          sequence: { groupOrder: 1 },
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
    ],
  },
});
