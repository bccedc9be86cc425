// @ts-check
import { existsSync, readFileSync } from 'node:fs';
import { inProject } from '../begin/project.mjs';
import { Refusal } from '../begin/refusal.mjs';
import { runChild } from './child.mjs';
import { compilerTools, explainMissing, findMissing, installDebianPackages } from './debian.mjs';

/** @typedef {Record<string, { version?: string, optional?: boolean }>} LockedPackages */

const driverFile = inProject('node_modules/better-sqlite3/build/Release/better_sqlite3.node');

/**
 * Installs the npm packages when they are not the ones that package-lock.json names.
 * @param {{ mayInstallTools: boolean }} options mayInstallTools: get a missing compiler with apt first, where allowed
 */
export async function installPackages({ mayInstallTools }) {
  if (arePackagesInstalled()) return;
  if (mayInstallTools) await installCompiler();
  console.log('Installing the packages (a minute or two) …');
  const npm = process.env['npm_execpath'];
  const { code, output } = await runChild({
    command: npm ? process.execPath : 'npm',
    args: [...(npm ? [npm] : []), 'ci', '--no-audit', '--no-fund'],
    limitMilliseconds: 1_200_000,
  });
  if (code === 0 && arePackagesInstalled()) return;
  throw new Refusal(explainFailedInstall(output));
}

/** Compares what npm has written down about node_modules with the lock file, and looks for the compiled driver. */
export function arePackagesInstalled() {
  const written = inProject('node_modules/.package-lock.json');
  if (!existsSync(written) || !existsSync(driverFile)) return false;
  return doPackagesMatch(readPackages(inProject('package-lock.json')), readPackages(written));
}

/**
 * @param {LockedPackages} locked
 * @param {LockedPackages} installed
 * @returns {boolean} whether each locked package is there in its version; optional ones may be absent on this machine
 */
export function doPackagesMatch(locked, installed) {
  return Object.entries(locked).every(([place, { version, optional }]) => {
    const found = installed[place];
    return place === '' || (found ? found.version === version : optional === true);
  });
}

/** A missing compiler matters only when no ready driver can be fetched, so no leave to install one is no failure yet. */
async function installCompiler() {
  const missing = findMissing(compilerTools);
  if (missing.length === 0) return;
  try {
    await installDebianPackages(missing);
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
  }
}

/**
 * @param {string} output what npm wrote
 * @returns {string} the likeliest reason in one sentence
 */
function explainFailedInstall(output) {
  const missing = findMissing(compilerTools);
  if (missing.length > 0) return explainMissing(missing, 'to build the SQLite driver');
  if (/\b(ENOTFOUND|EAI_AGAIN|ECONNREFUSED|ECONNRESET|ETIMEDOUT)\b/.test(output))
    return 'The packages could not be fetched: check that this machine reaches the npm registry, then try again.';
  if (/\b(EACCES|EPERM|EROFS)\b/.test(output))
    return 'The packages could not be written: check that this account may write to the folder "node_modules".';
  if (/\bENOSPC\b/.test(output)) return 'The packages could not be written: the disk is full.';
  return `The packages could not be installed. The last words of npm:\n${output.trimEnd().split('\n').slice(-30).join('\n')}`;
}

/**
 * @param {string} path of a lock file
 * @returns {LockedPackages}
 */
function readPackages(path) {
  return JSON.parse(readFileSync(path, 'utf8')).packages;
}
