// @ts-check
import { copyFileSync, existsSync, linkSync, renameSync, rmSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { Refusal, runCommand } from '../begin/refusal.mjs';
import { leaveOnSignals } from '../machine/child.mjs';
import { makeDataFolder } from '../start/data-folder.mjs';
import { lockDataFolder } from '../start/running.mjs';
import { readStartSettings } from '../start/settings.mjs';
import { explainUnusable, flushFile, openDatabaseFile, readFileArgument } from './database-file.mjs';

/** SQLite keeps what was written last in files beside the database; they belong to it under its name. */
const companions = ['', '-wal', '-shm'];

leaveOnSignals();
await runCommand(async () => {
  const { dataFolder, databaseFile } = readStartSettings(process.env);
  const file = resolve(readFileArgument('restore'));
  if (!existsSync(file)) throw new Refusal(`There is no file ${file}.`);
  makeDataFolder(dataFolder);
  lockDataFolder(dataFolder, 'a restore under way');
  const incoming = `${databaseFile}.incoming`;
  process.on('exit', () => removeWithCompanions(incoming));
  await prepareIncoming(file, incoming);
  const kept = keepReplaced(dataFolder, databaseFile);
  renameSync(incoming, databaseFile);
  flushFile(databaseFile);
  console.log(`Restored from ${file}.${kept && ` What was there before is kept as ${kept}.`}`);
});

/**
 * Copies the file into the data folder, so that the given one stays untouched, and checks the copy.
 * @param {string} file
 * @param {string} incoming
 */
async function prepareIncoming(file, incoming) {
  removeWithCompanions(incoming);
  for (const ending of ['', '-wal'])
    if (existsSync(file + ending)) copyFileSync(file + ending, incoming + ending);
  const db = await openDatabaseFile(incoming);
  const fault = explainUnusable(db);
  if (fault) throw new Refusal(`${file} cannot be restored: ${fault}. Nothing was changed.`);
  db.pragma('wal_checkpoint(TRUNCATE)');
  db.close();
  flushFile(incoming);
}

/**
 * @param {string} dataFolder
 * @param {string} databaseFile
 * @returns {string} the new name of the database that was there, or ''
 */
function keepReplaced(dataFolder, databaseFile) {
  if (!existsSync(databaseFile)) return '';
  const stamp = new Date().toISOString().replace(/[:.]/g, '-');
  const kept = join(dataFolder, `trywell-replaced-${stamp}.sqlite`);
  // A second name instead of a move: until the new file takes the old name, there is always a database under it.
  for (const ending of companions)
    if (existsSync(databaseFile + ending)) linkSync(databaseFile + ending, kept + ending);
  for (const ending of companions.slice(1)) rmSync(databaseFile + ending, { force: true });
  return kept;
}

/** @param {string} file */
function removeWithCompanions(file) {
  for (const ending of companions) rmSync(file + ending, { force: true });
}
