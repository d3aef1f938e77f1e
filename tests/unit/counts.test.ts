import { expect, test } from 'vitest';
import { countsLine, countTests } from '#tests/worlds/counts.ts';

const passedFile = { status: 'passed', assertionResults: [{ status: 'passed' }] };
const clean = {
  success: true,
  numPassedTests: 3,
  numFailedTests: 0,
  numPendingTests: 0,
  numTodoTests: 0,
  testResults: [passedFile],
};

test('a clean run names two figures', () => {
  expect(countsLine(countTests(clean))).toBe('3 passed, 0 failed');
});

test('skipped tests are named only where there are some', () => {
  expect(countsLine(countTests({ ...clean, numPendingTests: 1, numTodoTests: 1 }))).toBe(
    '3 passed, 0 failed, 2 skipped',
  );
});

test('a file that cannot be loaded is a failure', () => {
  const counts = countTests({
    ...clean,
    success: false,
    testResults: [passedFile, { status: 'failed', assertionResults: [] }],
  });
  expect(countsLine(counts)).toBe('3 passed, 1 failed');
  expect(counts.isSuccess).toBe(false);
});

test.each([
  ['nothing that ran', { ...clean, numPassedTests: 0, testResults: [] }],
  ['a runner that calls itself failed', { ...clean, success: false }],
  ['no report at all', null],
])('%s is no success', (_name, report) => {
  expect(countTests(report).isSuccess).toBe(false);
});
