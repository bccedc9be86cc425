// @ts-check
import { closeSync, fsyncSync, openSync, readdirSync } from 'node:fs';
import { dirname } from 'node:path';
import { inProject } from '../begin/project.mjs';
import { Refusal } from '../begin/refusal.mjs';

/** @typedef {import('better-sqlite3').Database} Database */

/** How long to wait for a write of the running product, in milliseconds. */
const busyTimeout = 10_000;

/**
 * @param {string} file
 * @returns {Promise<Database>}
 */
export async function openDatabaseFile(file) {
  const { default: Sqlite } = await import('better-sqlite3').catch(() => {
    throw new Refusal('The packages are not installed yet: run "npm run up" once, then try again.');
  });
  return new Sqlite(file, { fileMustExist: true, timeout: busyTimeout });
}

/**
 * Says what is wrong with a database of ours, or nothing: whether it is whole, whether each row points at one that exists,
 * and whether this version of the product knows every step that made it.
 * @param {Database} db
 * @returns {string} one sentence, or ''
 */
export function explainUnusable(db) {
  try {
    const findings = db.pragma('integrity_check', { simple: true });
    if (findings !== 'ok') return `it is damaged (${String(findings).split('\n')[0]})`;
    if (/** @type {unknown[]} */ (db.pragma('foreign_key_check')).length > 0)
      return 'rows in it point nowhere';
    const unknown = findUnknownMigrations(db);
    return unknown.length > 0 ? `a newer version of Trywell made it (${unknown.join(', ')})` : '';
  } catch (error) {
    const code = /** @type {{ code?: string }} */ (error).code ?? '';
    if (code === 'SQLITE_NOTADB') return 'it is not a database';
    if (code.startsWith('SQLITE_CORRUPT')) return 'it is damaged';
    if (/no such table/.test(String(error))) return 'it is not a database of Trywell';
    throw error;
  }
}

/**
 * @param {Database} db
 * @returns {string[]} names of migrations done to it that this version does not have
 */
function findUnknownMigrations(db) {
  const known = new Set(readdirSync(inProject('migrations')).filter((name) => name.endsWith('.ts')));
  const done = /** @type {string[]} */ (db.prepare('SELECT name FROM knex_migrations').pluck().all());
  return done.filter((name) => !known.has(name));
}

/**
 * Makes sure that a file, and its name in its folder, outlast a power cut.
 * @param {string} file
 */
export function flushFile(file) {
  for (const path of [file, dirname(file)]) {
    const handle = openSync(path, 'r');
    fsyncSync(handle);
    closeSync(handle);
  }
}

/**
 * The file named on the command line.
 * @param {string} command
 */
export function readFileArgument(command) {
  const [file, ...more] = process.argv.slice(2);
  if (!file || file.startsWith('-') || more.length > 0)
    throw new Refusal(`Name one file: npm run ${command} -- FILE`);
  if (process.env['DATABASE_URL'])
    throw new Refusal(
      'This installation keeps its data in a database server (DATABASE_URL): use that server’s own tools.',
    );
  return file;
}
