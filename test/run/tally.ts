// What a run of tests counts: every test is one, and so is every step beside the tests.

/** Passed and failed, and a sentence for each failure that the tests' own output does not show. */
export interface Tally {
  readonly passed: number;
  readonly failed: number;
  readonly remarks: readonly string[];
}

/** The parts of the test runner's report that are read here. */
export interface TestReport {
  readonly numPassedTests: number;
  readonly numFailedTests: number;
  readonly numTotalTests: number;
  readonly testResults: readonly {
    readonly name: string;
    readonly status: string;
    readonly assertionResults: readonly { readonly status: string }[];
  }[];
}

/** The tally of one step, named `name`, that ended with `exitCode`. */
export function tallyStep(name: string, exitCode: number): Tally {
  if (exitCode === 0) return { passed: 1, failed: 0, remarks: [] };
  return { passed: 0, failed: 1, remarks: [`${name} failed.`] };
}

/**
 * The tally of the tests `name`. A run that left no report, found no test, skipped one, could not load a file or ended
 * badly although every test passed has failed: what did not run was not tested.
 */
export function tallyTests(name: string, report: TestReport | null, exitCode: number): Tally {
  if (report === null) return { passed: 0, failed: 1, remarks: [`${name} ended without a report.`] };
  const remarks: string[] = [];
  let failed = report.numFailedTests;
  const skipped = report.numTotalTests - report.numPassedTests - report.numFailedTests;
  if (skipped > 0) {
    failed += skipped;
    remarks.push(`${name}: ${skipped} of ${report.numTotalTests} did not run.`);
  }
  for (const file of report.testResults) {
    if (file.status === 'passed' || file.assertionResults.some((test) => test.status === 'failed')) continue;
    failed += 1;
    remarks.push(`${name}: ${file.name} failed outside its tests.`);
  }
  if (report.numTotalTests === 0 && failed === 0) {
    failed += 1;
    remarks.push(`${name}: there was no test.`);
  }
  if (exitCode !== 0 && failed === 0) {
    failed += 1;
    remarks.push(`${name} ended with code ${exitCode} although every test passed.`);
  }
  return { passed: report.numPassedTests, failed, remarks };
}

/** The sum of several tallies. */
export function addTallies(tallies: readonly Tally[]): Tally {
  return {
    passed: tallies.reduce((sum, tally) => sum + tally.passed, 0),
    failed: tallies.reduce((sum, tally) => sum + tally.failed, 0),
    remarks: tallies.flatMap((tally) => tally.remarks),
  };
}
