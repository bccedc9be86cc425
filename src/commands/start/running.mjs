// @ts-check
import { readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { Refusal } from '../begin/refusal.mjs';

/** @typedef {{ pid: number, startTick: string | null, url: string }} Running */

/**
 * The process that holds the data folder, if one is alive. The product takes and checks the same lock itself when it
 * starts; the commands look first, because they must not rebuild or replace what a running process uses.
 * @param {string} dataFolder
 * @returns {Running | undefined}
 */
export function findRunning(dataFolder) {
  return ['all', 'web', 'worker']
    .map((role) => readLock(join(dataFolder, `trywell-${role}.lock`)))
    .find((lock) => lock !== undefined && isAlive(lock));
}

/**
 * Takes the lock of the whole data folder until this process ends, so that the product cannot start meanwhile.
 * @param {string} dataFolder
 * @param {string} reason shown to whoever tries to start it
 * @throws {Refusal} while a process holds the folder
 */
export function lockDataFolder(dataFolder, reason) {
  const holder = findRunning(dataFolder);
  if (holder)
    throw new Refusal(`Trywell runs (process ${holder.pid}, ${holder.url}): end it first, then try again.`);
  const file = join(dataFolder, 'trywell-all.lock');
  const { pid } = process;
  const content = { pid, startTick: startTickOf(pid), role: 'all', url: reason, startedAt: Date.now() };
  rmSync(file, { force: true });
  writeFileSync(file, JSON.stringify(content), { flag: 'wx' });
  process.on('exit', () => rmSync(file, { force: true }));
}

/**
 * @param {string} file
 * @returns {Running | undefined}
 */
function readLock(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return undefined;
  }
}

/** @param {Running} lock */
function isAlive({ pid, startTick }) {
  try {
    process.kill(pid, 0);
  } catch (error) {
    return /** @type {NodeJS.ErrnoException} */ (error).code === 'EPERM';
  }
  // The system may have given the number to another process since; when that one began tells them apart.
  return startTick === null || startTick === startTickOf(pid);
}

/** @param {number} pid */
function startTickOf(pid) {
  try {
    return readFileSync(`/proc/${pid}/stat`, 'utf8').split(') ').pop()?.split(' ')[19] ?? null;
  } catch {
    return null;
  }
}
