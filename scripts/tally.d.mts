interface TestReport {
  readonly numPassedTests: number;
  readonly numFailedTests: number;
  readonly numPendingTests?: number;
  readonly numTodoTests?: number;
  readonly testResults?: readonly { readonly status: string; readonly assertionResults: readonly { readonly status: string }[] }[];
}
export declare function tallyOf(report: TestReport): { readonly passed: number; readonly failed: number; readonly skipped: number };
