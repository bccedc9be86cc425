// @ts-check
import { accessSync, constants } from 'node:fs';
import { delimiter, join } from 'node:path';
import { Refusal } from '../begin/refusal.mjs';
import { runChild } from './child.mjs';

/** @typedef {{ programs: string[], packages: string[], purpose: string }} Tool any one of the programs will do */

/** What the SQLite driver needs to build itself where no ready binary can be had. @type {Tool[]} */
export const compilerTools = [
  {
    programs: ['g++', 'c++'],
    packages: ['build-essential'],
    purpose: 'the C++ compiler',
  },
  {
    programs: ['make'],
    packages: ['build-essential'],
    purpose: 'make',
  },
  { programs: ['python3'], packages: ['python3'], purpose: 'Python' },
];

/** What the browser tests need besides the npm packages. @type {Tool[]} */
export const browserTools = [
  {
    programs: ['chromium', 'chromium-browser'],
    packages: ['chromium', 'fonts-liberation'],
    purpose: 'Chromium',
  },
  {
    programs: ['pdftotext'],
    packages: ['poppler-utils'],
    purpose: 'pdftotext',
  },
];

/** What the integration tests need besides: the audit pack is worked out again by a program that is not ours. @type {Tool[]} */
export const recomputeTools = [
  {
    programs: ['Rscript'],
    packages: ['r-base-core'],
    purpose: 'R',
  },
];

/**
 * @param {string} program
 * @returns {string | undefined} where it lies on the PATH
 */
export function findProgram(program) {
  for (const folder of (process.env['PATH'] ?? '').split(delimiter)) {
    if (folder === '') continue;
    try {
      accessSync(join(folder, program), constants.X_OK);
      return join(folder, program);
    } catch {
      // Not in this folder.
    }
  }
  return undefined;
}

/**
 * @param {Tool[]} tools
 * @returns {Tool[]} those of which no program is on the PATH
 */
export function findMissing(tools) {
  return tools.filter((tool) => !tool.programs.some((program) => findProgram(program)));
}

/**
 * One sentence that names what is missing and how to get it.
 * @param {Tool[]} missing
 * @param {string} [purpose] what they are missing for, as `to …`
 */
export function explainMissing(missing, purpose) {
  const list = new Intl.ListFormat('en').format(missing.map((tool) => tool.purpose));
  const names = list.charAt(0).toUpperCase() + list.slice(1);
  const verb = missing.length === 1 ? 'is' : 'are';
  return `${names} ${verb} missing${purpose ? ` ${purpose}` : ''}: run "sudo apt-get install ${packagesOf(missing).join(' ')}", then try again.`;
}

/**
 * Installs Debian packages, where this account may do so without a question.
 * @param {Tool[]} missing
 * @throws {Refusal} where it may not, or where apt fails
 */
export async function installDebianPackages(missing) {
  const prefix = await findRootPrefix();
  if (!prefix || !findProgram('apt-get')) throw new Refusal(explainMissing(missing));
  const packages = packagesOf(missing);
  console.log(`Installing ${packages.join(', ')} with apt …`);
  const apt = async (/** @type {string[]} */ ...args) => {
    const [command = '', ...rest] = [
      ...prefix,
      'env',
      'DEBIAN_FRONTEND=noninteractive',
      'apt-get',
      '-q',
      ...args,
    ];
    return runChild({ command, args: rest, limitMilliseconds: 900_000 });
  };
  await apt('update');
  const { code, output } = await apt('install', '-y', '--no-install-recommends', ...packages);
  const still = findMissing(missing);
  if (code === 0 && still.length === 0) return;
  console.error(output.slice(-2_000));
  throw new Refusal(explainMissing(still.length > 0 ? still : missing));
}

/** @returns {Promise<string[] | undefined>} the words that make a command run as root; none when that is not allowed */
async function findRootPrefix() {
  if (process.getuid?.() === 0) return [];
  if (!findProgram('sudo')) return undefined;
  const { code } = await runChild({
    command: 'sudo',
    args: ['-n', 'true'],
    limitMilliseconds: 10_000,
  });
  return code === 0 ? ['sudo', '-n'] : undefined;
}

/** @param {Tool[]} tools */
function packagesOf(tools) {
  return [...new Set(tools.flatMap((tool) => tool.packages))];
}
