// @ts-check
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { buildProductIfChanged } from '../build/product.mjs';
import { runChild } from '../machine/child.mjs';
import { browserTools, findMissing, installDebianPackages, recomputeTools } from '../machine/debian.mjs';
import { installPackages } from '../machine/packages.mjs';
import { countReport } from './vitest-report.mjs';

/** @typedef {import('./run-steps.mjs').Step} Step */

/** No step waits longer: a test that hangs is a failure, not an endless run. */
const stepLimitMilliseconds = 900_000;

/** @type {Step} */
export const installStep = {
  name: 'packages',
  essential: true,
  run: async () => {
    await installPackages({ mayInstallTools: true });
    return { passed: 0, failed: 0 };
  },
};

/** @type {Step} */
export const typesStep = {
  name: 'types',
  run: () => runTool(['node_modules/astro/astro.js', 'check', '--minimumFailingSeverity', 'warning']),
};

/** @type {Step} */
export const lintStep = {
  name: 'lint',
  run: () => runTool(['node_modules/@biomejs/biome/bin/biome', 'check', '--error-on-warnings', '.']),
};

/** @type {Step} */
export const buildStep = {
  name: 'build',
  run: async () => {
    await buildProductIfChanged();
    return { passed: 1, failed: 0 };
  },
};

/** @type {Step} */
export const unitStep = { name: 'unit', run: () => runTests(['unit', 'dom']) };

/** @type {Step} */
export const integrationStep = {
  name: 'integration',
  run: async () => {
    await installTools(recomputeTools);
    return runTests(['integration']);
  },
};

/** @type {Step} */
export const browserStep = {
  name: 'browser',
  run: async () => {
    await installTools(browserTools);
    return runTests(['browser']);
  },
};

/** @param {import('../machine/debian.mjs').Tool[]} tools */
async function installTools(tools) {
  const missing = findMissing(tools);
  if (missing.length > 0) await installDebianPackages(missing);
}

/**
 * Runs a checker; its words are shown only when it finds something.
 * @param {string[]} args
 */
async function runTool(args) {
  const { code, output } = await runNode(args);
  if (code === 0) return { passed: 1, failed: 0 };
  console.log(output);
  return { passed: 0, failed: 1 };
}

/**
 * Runs vitest projects and counts their tests strictly.
 * @param {string[]} projects
 */
async function runTests(projects) {
  const folder = mkdtempSync(join(tmpdir(), 'trywell-report-'));
  try {
    const reportFile = join(folder, 'report.json');
    const { code, output } = await runNode([
      'node_modules/vitest/vitest.mjs',
      'run',
      '--config=tests/vitest.config.ts',
      '--allowOnly=false',
      '--reporter=default',
      '--reporter=json',
      `--outputFile.json=${reportFile}`,
      ...projects.map((project) => `--project=${project}`),
    ]);
    const report = existsSync(reportFile)
      ? JSON.parse(readFileSync(reportFile, 'utf8'))
      : { testResults: [] };
    const { passed, failed, faults } = countReport(report, code);
    if (failed > 0) console.log([output, ...faults].join('\n'));
    return { passed, failed };
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** @param {string[]} args */
function runNode(args) {
  return runChild({
    command: process.execPath,
    args,
    env: { ...process.env, ASTRO_TELEMETRY_DISABLED: '1', NO_COLOR: '1' },
    limitMilliseconds: stepLimitMilliseconds,
  });
}
