// @ts-check
import { chmodSync, existsSync, renameSync, rmSync, statSync } from 'node:fs';
import { resolve } from 'node:path';
import { Refusal, runCommand } from '../begin/refusal.mjs';
import { leaveOnSignals } from '../machine/child.mjs';
import { readStartSettings } from '../start/settings.mjs';
import { explainUnusable, flushFile, openDatabaseFile, readFileArgument } from './database-file.mjs';

leaveOnSignals();
await runCommand(async () => {
  const { databaseFile } = readStartSettings(process.env);
  const file = resolve(readFileArgument('backup'));
  if (existsSync(file)) throw new Refusal(`${file} is already there: name another file.`);
  if (!existsSync(databaseFile)) throw new Refusal(`There is no database at ${databaseFile} to copy.`);
  await copyChecked(databaseFile, file);
  const megabytes = (statSync(file).size / 1_000_000).toFixed(1);
  console.log(`The backup is in ${file} (${megabytes} MB, checked). It holds personal data: keep it safe.`);
});

/**
 * Copies the database as it is at one moment, while others may write to it. The copy gets its name only when it is
 * whole, so a file of that name is always a good one.
 * @param {string} databaseFile
 * @param {string} file
 */
async function copyChecked(databaseFile, file) {
  const unfinished = `${file}.unfinished-${process.pid}`;
  // A copy that was broken off, by an error or by a signal, leaves nothing behind.
  process.on('exit', () => rmSync(unfinished, { force: true }));
  try {
    const db = await openDatabaseFile(databaseFile);
    db.prepare('VACUUM INTO ?').run(unfinished);
    db.close();
    chmodSync(unfinished, 0o600);
    const copy = await openDatabaseFile(unfinished);
    const fault = explainUnusable(copy);
    copy.close();
    if (fault) throw new Refusal(`The copy cannot be used: ${fault}.`);
  } catch (error) {
    throw explainFailure(error, file);
  }
  flushFile(unfinished);
  renameSync(unfinished, file);
  flushFile(file);
}

/**
 * @param {unknown} error
 * @param {string} file
 */
function explainFailure(error, file) {
  const code = /** @type {{ code?: string }} */ (error).code ?? '';
  if (code === 'SQLITE_CANTOPEN')
    return new Refusal(`${file} cannot be written: check that its folder is there and yours.`);
  if (code === 'SQLITE_FULL' || code === 'ENOSPC')
    return new Refusal(`${file} cannot be written: the disk is full.`);
  if (code.startsWith('SQLITE_BUSY')) return new Refusal('The database is busy: try again in a moment.');
  if (code === 'SQLITE_NOTADB' || code.startsWith('SQLITE_CORRUPT'))
    return new Refusal('The database is damaged and cannot be copied: restore the last good backup.');
  return error;
}
