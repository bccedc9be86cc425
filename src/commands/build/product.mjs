// @ts-check
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { inProject, projectFolder } from '../begin/project.mjs';
import { Refusal } from '../begin/refusal.mjs';
import { runChild } from '../machine/child.mjs';
import { hashSources } from './source-hash.mjs';

const hashFile = inProject('dist/sources.sha256');

/** Whether dist/ was built from the sources as they are now. */
export function isProductBuilt() {
  return existsSync(hashFile) && readFileSync(hashFile, 'utf8') === hashSources(projectFolder);
}

/** Builds only when the sources have changed, so that a running product keeps the files it runs from. */
export async function buildProductIfChanged() {
  if (isProductBuilt()) return;
  console.log('Building …');
  await buildProduct();
}

/**
 * Builds dist/: pages and islands, then the two programs beside them. The order matters: Astro empties dist/ first.
 * The hash comes last, so a build that broke off is never taken for a whole one.
 */
export async function buildProduct() {
  const hash = hashSources(projectFolder);
  const environment = {
    ...process.env,
    NODE_ENV: 'production',
    ASTRO_TELEMETRY_DISABLED: '1',
  };
  await runBuild(['node_modules/astro/astro.js', 'build'], environment);
  await runBuild(['src/commands/build/programs.mjs'], environment);
  writeFileSync(hashFile, hash);
}

/**
 * @param {string[]} args
 * @param {NodeJS.ProcessEnv} env
 */
async function runBuild(args, env) {
  const { code, output } = await runChild({
    command: process.execPath,
    args,
    env,
    limitMilliseconds: 600_000,
  });
  if (code === 0) return;
  console.error(output);
  throw new Refusal('The build failed: the lines above say where.');
}
