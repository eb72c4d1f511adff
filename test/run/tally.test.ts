// The count at the end of a test run: nothing that did not run may pass.

import { expect, test } from 'vitest';
import { addTallies, tallyStep, tallyTests } from './tally.ts';
import type { TestReport } from './tally.ts';

function reportOf(...statuses: string[]): TestReport {
  return {
    numPassedTests: statuses.filter((status) => status === 'passed').length,
    numFailedTests: statuses.filter((status) => status === 'failed').length,
    numTotalTests: statuses.length,
    testResults: [
      {
        name: 'a.test.ts',
        status: statuses.includes('failed') ? 'failed' : 'passed',
        assertionResults: statuses.map((status) => ({ status })),
      },
    ],
  };
}

test('a step counts once', () => {
  expect(tallyStep('Lint', 0)).toEqual({ passed: 1, failed: 0, remarks: [] });
  expect(tallyStep('Lint', 2)).toEqual({ passed: 0, failed: 1, remarks: ['Lint failed.'] });
});

test('every test counts once', () => {
  expect(tallyTests('Tests', reportOf('passed', 'passed', 'failed'), 1)).toEqual({ passed: 2, failed: 1, remarks: [] });
});

test('a run without a report has failed', () => {
  expect(tallyTests('Tests', null, 0)).toMatchObject({ passed: 0, failed: 1 });
});

test('a run without a test has failed', () => {
  expect(tallyTests('Tests', { ...reportOf(), testResults: [] }, 0)).toMatchObject({ passed: 0, failed: 1 });
});

test('a skipped test has failed', () => {
  expect(tallyTests('Tests', reportOf('passed', 'skipped', 'todo'), 0)).toMatchObject({ passed: 1, failed: 2 });
});

test('a file that could not be loaded has failed', () => {
  const report = reportOf('passed');
  const broken = { name: 'b.test.ts', status: 'failed', assertionResults: [] };
  const tally = tallyTests('Tests', { ...report, testResults: [...report.testResults, broken] }, 1);
  expect(tally).toEqual({ passed: 1, failed: 1, remarks: ['Tests: b.test.ts failed outside its tests.'] });
});

test('a run that ends badly after its last test has failed', () => {
  expect(tallyTests('Tests', reportOf('passed'), 1)).toMatchObject({ passed: 1, failed: 1 });
});

test('tallies add up', () => {
  const sum = addTallies([tallyStep('A', 0), tallyStep('B', 1), tallyTests('C', reportOf('passed', 'failed'), 1)]);
  expect(sum).toEqual({ passed: 2, failed: 2, remarks: ['B failed.'] });
});
