// @ts-check

/**
 * @typedef {{ status: string, fullName: string, failureMessages?: string[] }} Assertion
 * @typedef {{ name: string, status: string, message: string, assertionResults: Assertion[] }} ReportedFile
 * @typedef {{ testResults: ReportedFile[] }} Report as vitest's JSON reporter writes it
 */

/**
 * Counts a report strictly: what was skipped or is still to be written is a failure, and so is a file that did not load,
 * a run without tests, and a run that ended badly although each test passed.
 * @param {Report} report
 * @param {number} exitCode of the runner
 * @returns {{ passed: number, failed: number, faults: string[] }} faults: one line for each failure
 */
export function countReport(report, exitCode) {
  let passed = 0;
  /** @type {string[]} */
  const faults = [];
  for (const file of report.testResults) {
    const before = faults.length;
    for (const { status, fullName } of file.assertionResults) {
      if (status === 'passed') passed += 1;
      else faults.push(`${file.name}: ${fullName} (${status})`);
    }
    const isFaultless = faults.length === before;
    if (file.status !== 'passed' && isFaultless)
      faults.push(`${file.name}: ${file.message || 'the file failed'}`);
    else if (file.assertionResults.length === 0) faults.push(`${file.name}: no tests in it`);
  }
  if (passed === 0 && faults.length === 0) faults.push('no tests were found');
  if (exitCode !== 0 && faults.length === 0)
    faults.push(`the runner ended with ${exitCode} although each test passed`);
  return { passed, failed: faults.length, faults };
}
