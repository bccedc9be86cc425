// @ts-check
import { relative } from 'node:path';
import { projectFolder } from '../begin/project.mjs';

/** @typedef {{ name: string, role: string, email: string, password: string }} SignIn */

/**
 * Says where everything is.
 * @param {object} facts
 * @param {Record<string, unknown>} facts.main what the product said when it was ready
 * @param {Record<string, unknown> | undefined} facts.fakes what the stand-ins said
 * @param {string} facts.logFile
 */
export function printWelcome({ main, fakes, logFile }) {
  const lines = ['', `Trywell runs at ${main['url']}`];
  const signIns = /** @type {SignIn[]} */ (main['signIns'] ?? []);
  if (signIns.length > 0) lines.push('', 'Sign in as', ...alignColumns(signIns.map(columnsOf)));
  if (main['setUpUrl']) lines.push('', `Make the first shop at ${main['setUpUrl']} (the link works once)`);
  if (fakes)
    lines.push('', `The crew's phones  ${fakes['textsUrl']}`, `The mailbox        ${fakes['mailUrl']}`);
  const shortName = relative(projectFolder, logFile);
  const logName = shortName.startsWith('..') ? logFile : shortName;
  lines.push('', `The log is in ${logName}. Ctrl-C ends it all.`, '');
  console.log(lines.join('\n'));
}

/** @param {SignIn} signIn */
function columnsOf({ role, name, email, password }) {
  return [role, name, email, password];
}

/**
 * @param {string[][]} rows
 * @returns {string[]}
 */
function alignColumns(rows) {
  const widthOf = (/** @type {number} */ column) =>
    Math.max(...rows.map((row) => (row[column] ?? '').length));
  return rows.map(
    (row) =>
      `  ${row
        .map((cell, column) => cell.padEnd(widthOf(column) + 2))
        .join('')
        .trimEnd()}`,
  );
}
