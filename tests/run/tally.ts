/** What came out of one step, or of all of them. */
export interface Tally {
  readonly passed: number;
  readonly failed: number;
  readonly skipped: number;
}

export const NOTHING: Tally = { passed: 0, failed: 0, skipped: 0 };

export function sum(tallies: readonly Tally[]): Tally {
  return tallies.reduce(
    (all, one) => ({
      passed: all.passed + one.passed,
      failed: all.failed + one.failed,
      skipped: all.skipped + one.skipped,
    }),
    NOTHING,
  );
}

/** The closing line: `12 passed, 0 failed`, with `, 1 skipped` where something was. */
export function closingLine({ passed, failed, skipped }: Tally): string {
  return `${passed} passed, ${failed} failed${skipped > 0 ? `, ${skipped} skipped` : ''}`;
}

/** A step that is one check: it holds or it does not. */
export function ofCheck(exitCode: number): Tally {
  return exitCode === 0 ? { ...NOTHING, passed: 1 } : { ...NOTHING, failed: 1 };
}

interface VitestReport {
  readonly numPassedTests: number;
  readonly numFailedTests: number;
  readonly numPendingTests: number;
  readonly numTodoTests: number;
  readonly testResults: readonly { readonly status: string; readonly assertionResults: readonly unknown[] }[];
}

/**
 * Counts from Vitest's own report. A file that could not be loaded ran no test and counts as one failure; so does a run
 * that ended badly without naming one (an error outside any test, no report, no test at all).
 */
export function ofVitest(report: string | null, exitCode: number): Tally {
  if (report === null) return { ...NOTHING, failed: 1 };
  const read = JSON.parse(report) as VitestReport;
  const unread = read.testResults.filter(
    (file) => file.status === 'failed' && file.assertionResults.length === 0,
  ).length;
  return closed(
    {
      passed: read.numPassedTests,
      failed: read.numFailedTests + unread,
      skipped: read.numPendingTests + read.numTodoTests,
    },
    exitCode,
  );
}

interface PlaywrightReport {
  readonly stats: {
    readonly expected: number;
    readonly unexpected: number;
    readonly flaky: number;
    readonly skipped: number;
  };
  readonly errors: readonly unknown[];
}

/** Counts from Playwright's own report. A test that passed only on a second try counts as failed. */
export function ofPlaywright(report: string | null, exitCode: number): Tally {
  if (report === null) return { ...NOTHING, failed: 1 };
  const { stats, errors } = JSON.parse(report) as PlaywrightReport;
  return closed(
    { passed: stats.expected, failed: stats.unexpected + stats.flaky + errors.length, skipped: stats.skipped },
    exitCode,
  );
}

/** No run that ended badly, or that ran nothing, may look clean. */
function closed(tally: Tally, exitCode: number): Tally {
  const ranNothing = tally.passed + tally.failed + tally.skipped === 0;
  return tally.failed === 0 && (exitCode !== 0 || ranNothing) ? { ...tally, failed: 1 } : tally;
}
