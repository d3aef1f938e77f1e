/** What of Vitest's JSON report the last line of `npm test` is made from. */
export type RunnerReport = {
  success: boolean;
  numPassedTests: number;
  numFailedTests: number;
  numPendingTests: number;
  numTodoTests: number;
  testResults: { status: string; assertionResults: { status: string }[] }[];
};

export type Counts = { passed: number; failed: number; skipped: number; isSuccess: boolean };

/** The figures of a run; a file that failed before or outside its tests counts as one failure. No report is no success. */
export function countTests(report: RunnerReport | null): Counts {
  if (report === null) return { passed: 0, failed: 0, skipped: 0, isSuccess: false };
  const failed = report.numFailedTests + report.testResults.filter(isBrokenFile).length;
  const passed = report.numPassedTests;
  const skipped = report.numPendingTests + report.numTodoTests;
  return { passed, failed, skipped, isSuccess: report.success && failed === 0 && passed > 0 };
}

function isBrokenFile({ status, assertionResults }: RunnerReport['testResults'][number]): boolean {
  return status === 'failed' && !assertionResults.some((result) => result.status === 'failed');
}

export function countsLine({ passed, failed, skipped }: Counts): string {
  return `${passed} passed, ${failed} failed${skipped > 0 ? `, ${skipped} skipped` : ''}`;
}
