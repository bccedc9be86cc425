// @ts-check
import { join } from 'node:path';
import { runCommand } from '../begin/refusal.mjs';
import { buildProductIfChanged } from '../build/product.mjs';
import { leavingSignals, stopAllChildren } from '../machine/child.mjs';
import { installPackages } from '../machine/packages.mjs';
import { makeDataFolder } from './data-folder.mjs';
import { startProgram } from './program.mjs';
import { findRunning } from './running.mjs';
import { demoEnvironment, readStartSettings } from './settings.mjs';
import { printWelcome } from './welcome.mjs';

/**
 * @typedef {import('./program.mjs').Program} Program
 * @typedef {{ main: Program, fakes: Program | undefined, logFile: string }} Programs
 */

/** Long enough for a text or a page under way; after it the product is ended by force. */
const graceMilliseconds = 30_000;

await runCommand(async () => {
  const settings = readStartSettings(process.env);
  const running = findRunning(settings.dataFolder);
  if (running) {
    console.log(`Trywell already runs at ${running.url} (process ${running.pid}).`);
    return;
  }
  makeDataFolder(settings.dataFolder);
  const asked = waitForLeave();
  const programs = await Promise.race([prepareAndStart(settings), asked]);
  if (programs === 'asked') {
    await stopAllChildren();
    console.log('Ended before Trywell was started.');
    process.exit(0);
  }
  await stayUntilEnd(programs, asked);
});

/** @returns {Promise<'asked'>} settles when a person or the machine asks the command to end */
function waitForLeave() {
  return new Promise((resolve) => {
    for (const signal of leavingSignals) process.on(signal, () => resolve('asked'));
  });
}

/**
 * @param {import('./settings.mjs').StartSettings} settings
 * @returns {Promise<Programs>} the product, and in demo mode the stand-ins for hosted services
 */
async function prepareAndStart(settings) {
  await installPackages({ mayInstallTools: false });
  await buildProductIfChanged();
  const common = settings.isDemo ? demoEnvironment(settings, process.env) : process.env;
  const env = { ...common, NODE_ENV: 'production' };
  const fakes = settings.isDemo
    ? await startProgram({ name: 'the stand-in for texts and mail', args: ['dist/main/fakes.mjs'], env })
    : undefined;
  const main = await startProgram({
    name: 'Trywell',
    args: ['dist/main/main.mjs'],
    env: { ...env, ...(fakes && addressesOf(fakes.ready)) },
  });
  const logFile = join(settings.dataFolder, 'up.log');
  main.keepLog(logFile);
  fakes?.keepLog(join(settings.dataFolder, 'fakes.log'));
  printWelcome({ main: main.ready, fakes: fakes?.ready, logFile });
  return { main, fakes, logFile };
}

/**
 * Stays until asked to end or until a program ends by itself, and ends the product before what it speaks to.
 * @param {Programs} programs
 * @param {Promise<'asked'>} asked
 */
async function stayUntilEnd({ main, fakes, logFile }, asked) {
  const first = await Promise.race([
    asked,
    main.ended.then(() => 'Trywell'),
    ...(fakes ? [fakes.ended.then(() => 'the stand-in for texts and mail')] : []),
  ]);
  const ending = await main.stop(graceMilliseconds);
  await fakes?.stop(graceMilliseconds);
  if (first !== 'asked') {
    console.error(`Trywell has ended, because ${first} ended by itself: ${logFile} says why.`);
    process.exitCode = 1;
  } else if (ending.code !== 0) {
    console.error(`Trywell did not end in an orderly way: ${logFile} says why.`);
    process.exitCode = 1;
  } else {
    console.log('Trywell has ended. Your data is kept.');
  }
}

/**
 * @param {Record<string, unknown>} ready of the stand-ins
 * @returns {NodeJS.ProcessEnv} where the product finds them
 */
function addressesOf({ textsUrl, smtpPort }) {
  return { TWILIO_API_URL: String(textsUrl), SMTP_HOST: '127.0.0.1', SMTP_PORT: String(smtpPort) };
}
