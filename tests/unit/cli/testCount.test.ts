import { describe, expect, it } from 'vitest';
import { countTests } from '../../../src/cli/testCount.mjs';

const file = (status: string, ...tests: string[]) => ({
  status,
  assertionResults: tests.map((one) => ({ status: one })),
});

describe('countTests', () => {
  it('counts tests that passed and failed', () => {
    const testResults = [file('passed', 'passed'), file('failed', 'passed', 'failed')];
    const report = { numPassedTests: 2, numFailedTests: 1, testResults };
    expect(countTests(report, 1)).toEqual({ passed: 2, failed: 1 });
  });

  it('counts a file that could not be loaded as a failure', () => {
    const testResults = [file('passed', 'passed'), file('failed')];
    const report = { numPassedTests: 1, numFailedTests: 0, testResults };
    expect(countTests(report, 1)).toEqual({ passed: 1, failed: 1 });
  });

  it('never calls a run good that ended badly or told nothing', () => {
    const report = { numPassedTests: 3, numFailedTests: 0, testResults: [] };
    expect(countTests(report, 1)).toEqual({ passed: 3, failed: 1 });
    expect(countTests(null, 0)).toEqual({ passed: 0, failed: 1 });
  });
});
