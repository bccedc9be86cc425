// @ts-check
import { readFileSync } from 'node:fs';
import { join } from 'node:path';

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
