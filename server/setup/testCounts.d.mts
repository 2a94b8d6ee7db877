export interface TestCounts {
  passed: number;
  failed: number;
  skipped: number;
  broken: string[];
}
export interface VitestReport {
  numPassedTests: number;
  numFailedTests: number;
  numPendingTests?: number;
  numTodoTests?: number;
  testResults: { name: string; status: string; assertionResults: unknown[] }[];
}
export function testCounts(report: VitestReport | undefined, exitCode: number): TestCounts;
export function summaryLine(parts: { passed: number; failed: number }[]): string;
