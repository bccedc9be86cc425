// @ts-check
import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';

const sources = [
  'src',
  'locales',
  'migrations',
  'seeds',
  'public',
  'astro.config.mjs',
  'tsconfig.json',
  'package.json',
  'package-lock.json',
];

/**
 * A fingerprint of all that the build reads, tests left out: equal fingerprints mean equal builds.
 * @param {string} folder the project
 * @returns {string} SHA-256 in hexadecimal
 */
export function hashSources(folder) {
  const hash = createHash('sha256').update(process.versions.node);
  for (const path of sources.flatMap((source) => listFiles(folder, source))) {
    const bytes = readFileSync(join(folder, path));
    hash.update(`\n${path} ${bytes.length}\n`).update(bytes);
  }
  return hash.digest('hex');
}

/**
 * @param {string} folder
 * @param {string} path below the folder
 * @returns {string[]} the files at or below that path, in one fixed order
 */
function listFiles(folder, path) {
  const absolute = join(folder, path);
  if (!existsSync(absolute)) return [];
  if (!statSync(absolute).isDirectory()) return /\.(test|bench)\.tsx?$/.test(path) ? [] : [path];
  return readdirSync(absolute)
    .sort()
    .flatMap((name) => listFiles(folder, `${path}/${name}`));
}
