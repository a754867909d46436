import { describe, expect, it } from 'vitest';

import { sum, tallyOf } from './tally.mjs';

const report = (numPassedTests, numFailedTests, testResults = []) => ({ numPassedTests, numFailedTests, testResults });

describe('the tally', () => {
  it('takes the tests Vitest counted', () => {
    expect(tallyOf(report(5, 0), 0)).toEqual({ passed: 5, failed: 0 });
    const failing = { status: 'failed', assertionResults: [{ status: 'passed' }, { status: 'failed' }] };
    expect(tallyOf(report(5, 1, [failing]), 1)).toEqual({ passed: 5, failed: 1 });
  });

  it('counts a file that could not be loaded', () => {
    expect(tallyOf(report(5, 0, [{ status: 'failed', assertionResults: [] }]), 1)).toEqual({ passed: 5, failed: 1 });
  });

  it('counts an error outside every test', () => {
    expect(tallyOf(report(5, 0), 1)).toEqual({ passed: 5, failed: 1 });
  });

  it('counts a run that wrote no report', () => {
    expect(tallyOf(undefined, 139)).toEqual({ passed: 0, failed: 1 });
  });

  it('adds up parts', () => {
    expect(
      sum([
        { passed: 5, failed: 0 },
        { passed: 2, failed: 3 },
      ]),
    ).toEqual({ passed: 7, failed: 3 });
  });
});
