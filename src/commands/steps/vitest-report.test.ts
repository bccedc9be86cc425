import { describe, expect, it } from 'vitest';
import { countReport } from './vitest-report.mjs';

function reportOf(...statuses: string[]) {
  const status = statuses.includes('failed') ? 'failed' : 'passed';
  const assertionResults = statuses.map((each, index) => ({
    status: each,
    fullName: `test ${index}`,
  }));
  return {
    testResults: [{ name: 'a.test.ts', status, message: '', assertionResults }],
  };
}

describe('countReport', () => {
  it('counts each test that passed', () => {
    expect(countReport(reportOf('passed', 'passed'), 0)).toEqual({
      passed: 2,
      failed: 0,
      faults: [],
    });
  });

  it('counts a failed test and names it', () => {
    const counted = countReport(reportOf('passed', 'failed'), 1);
    expect(counted).toEqual({
      passed: 1,
      failed: 1,
      faults: ['a.test.ts: test 1 (failed)'],
    });
  });

  it.each(['skipped', 'pending', 'todo', 'disabled'])('counts a %s test as a failure', (status) => {
    expect(countReport(reportOf('passed', status), 0)).toMatchObject({
      passed: 1,
      failed: 1,
    });
  });

  it('counts a file that did not load', () => {
    const file = {
      name: 'a.test.ts',
      status: 'failed',
      message: 'cannot find module',
      assertionResults: [],
    };
    const counted = countReport({ testResults: [file] }, 1);
    expect(counted).toEqual({
      passed: 0,
      failed: 1,
      faults: ['a.test.ts: cannot find module'],
    });
  });

  it('counts a file without tests', () => {
    expect(countReport(reportOf(), 0)).toMatchObject({ passed: 0, failed: 1 });
  });

  it('counts an error outside all tests, such as in a file after its tests', () => {
    const report = reportOf('passed');
    report.testResults[0] = {
      name: 'a.test.ts',
      status: 'failed',
      message: 'after',
      assertionResults: [],
    };
    expect(countReport(report, 1)).toMatchObject({ passed: 0, failed: 1 });
    expect(countReport(reportOf('passed'), 1)).toMatchObject({
      passed: 1,
      failed: 1,
    });
  });

  it('counts a run without any test', () => {
    expect(countReport({ testResults: [] }, 0)).toMatchObject({
      passed: 0,
      failed: 1,
    });
  });
});
