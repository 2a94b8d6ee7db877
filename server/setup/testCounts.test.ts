import { expect, test } from 'vitest';
import { summaryLine, testCounts } from './testCounts.mjs';

const report = (passed: number, failed: number, testResults: object[] = []) => ({
  numPassedTests: passed,
  numFailedTests: failed,
  testResults: testResults as { name: string; status: string; assertionResults: unknown[] }[],
});

test('counts what passed and what failed', () => {
  expect(testCounts(report(7, 2), 1)).toEqual({ passed: 7, failed: 2, skipped: 0, broken: [] });
});

test('a file that cannot be loaded is one failure, by name', () => {
  const files = [
    { name: 'a.test.ts', status: 'failed', assertionResults: [] },
    { name: 'b.test.ts', status: 'failed', assertionResults: [{}] },
  ];
  expect(testCounts(report(7, 1, files), 1)).toMatchObject({ failed: 2, broken: ['a.test.ts'] });
});

test('a red run without a failed test is still red', () => {
  expect(testCounts(report(7, 0), 1)).toMatchObject({ passed: 7, failed: 1 });
  expect(testCounts(undefined, 139)).toMatchObject({ passed: 0, failed: 1 });
});

test('no test files yet: nothing to count', () => {
  expect(testCounts(undefined, 0)).toEqual({ passed: 0, failed: 0, skipped: 0, broken: [] });
});

test('skipped ones are told, and counted as neither', () => {
  const skipping = { ...report(1, 0), numPendingTests: 2, numTodoTests: 1 };
  expect(testCounts(skipping, 0)).toMatchObject({ passed: 1, failed: 0, skipped: 3 });
});

test('the last line adds everything up', () => {
  const parts = [
    { passed: 5, failed: 0 },
    { passed: 120, failed: 2 },
  ];
  expect(summaryLine(parts)).toBe('125 passed, 2 failed');
  expect(summaryLine([])).toBe('0 passed, 0 failed');
});
