import { expect, test } from 'vitest';
import { closingLine, ofCheck, ofPlaywright, ofVitest, sum } from './tally.ts';

const vitest = (counts: object, testResults: object[] = []): string =>
  JSON.stringify({ numPassedTests: 0, numFailedTests: 0, numPendingTests: 0, numTodoTests: 0, testResults, ...counts });

test('a check counts once', () => {
  expect(ofCheck(0)).toEqual({ passed: 1, failed: 0, skipped: 0 });
  expect(ofCheck(2)).toEqual({ passed: 0, failed: 1, skipped: 0 });
});

test('unit tests count as their own report says', () => {
  const report = vitest({ numPassedTests: 7, numFailedTests: 1, numPendingTests: 2, numTodoTests: 1 });
  expect(ofVitest(report, 1)).toEqual({ passed: 7, failed: 1, skipped: 3 });
});

test('a file that could not be loaded is a failure', () => {
  const report = vitest({ numPassedTests: 7 }, [{ status: 'failed', assertionResults: [] }]);
  expect(ofVitest(report, 1)).toEqual({ passed: 7, failed: 1, skipped: 0 });
});

test.each([
  ['ended badly though every test passed', vitest({ numPassedTests: 7 }), 1],
  ['ran nothing', vitest({}), 0],
  ['left no report', null, 0],
])('a run that %s is a failure', (_how, report, exitCode) => {
  expect(ofVitest(report, exitCode).failed).toBe(1);
});

test('end-to-end tests count as their own report says, and a second try is a failure', () => {
  const stats = { expected: 4, unexpected: 1, flaky: 1, skipped: 2 };
  expect(ofPlaywright(JSON.stringify({ stats, errors: [] }), 1)).toEqual({ passed: 4, failed: 2, skipped: 2 });
  const none = { expected: 0, unexpected: 0, flaky: 0, skipped: 0 };
  expect(ofPlaywright(JSON.stringify({ stats: none, errors: [{}] }), 1).failed).toBe(1);
  expect(ofPlaywright(JSON.stringify({ stats: none, errors: [] }), 0).failed).toBe(1);
});

test('the closing line says what was skipped only where something was', () => {
  const all = sum([ofCheck(0), ofCheck(0), ofCheck(1)]);
  expect(closingLine(all)).toBe('2 passed, 1 failed');
  expect(closingLine({ ...all, skipped: 3 })).toBe('2 passed, 1 failed, 3 skipped');
});
