import { describe, expect, it } from 'vitest';
import { countPlaywright, countVitest } from '../../../server/bin/prepare/test-runners.ts';

describe('the count that npm test ends with', () => {
  it('takes in a test file that could not be loaded', () => {
    const report = {
      numPassedTests: 3,
      numFailedTests: 1,
      testResults: [
        { status: 'failed', assertionResults: [{ status: 'failed' }, { status: 'passed' }] },
        { status: 'failed', assertionResults: [] },
      ],
    };
    expect(countVitest(report, 1)).toEqual({ passed: 3, failed: 2 });
  });

  it('is never clean when a runner ended badly, report or no report', () => {
    expect(countVitest({ numPassedTests: 5, numFailedTests: 0 }, 1)).toEqual({ passed: 5, failed: 1 });
    expect(countVitest(null, 1)).toEqual({ passed: 0, failed: 1 });
    expect(countPlaywright({ stats: { expected: 2, unexpected: 0 } }, 1)).toEqual({ passed: 2, failed: 1 });
  });

  it('adds up journeys', () => {
    expect(countPlaywright({ stats: { expected: 2, flaky: 1, unexpected: 1 }, errors: [] }, 1)).toEqual({ passed: 3, failed: 1 });
  });
});
