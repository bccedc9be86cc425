// @ts-check
import { spawn } from 'node:child_process';
import { projectFolder } from '../begin/project.mjs';

/**
 * @typedef {{ code: number | null, signal: NodeJS.Signals | null }} Ending
 * @typedef {{ pid: number, ended: Promise<Ending>, stop: (graceMilliseconds: number) => Promise<Ending> }} Child
 */

/** The signals by which a person or the machine asks a process to end. @type {NodeJS.Signals[]} */
export const leavingSignals = ['SIGINT', 'SIGTERM', 'SIGHUP'];

/** @type {Set<Child>} */
const children = new Set();

// Whatever way this process ends, nothing it started outlives it.
process.on('exit', () => {
  for (const { pid } of children) signalGroup(pid, 'SIGKILL');
});

/** Leaves at once on Ctrl-C and the like, for commands that have nothing to finish. */
export function leaveOnSignals() {
  for (const signal of leavingSignals) process.once(signal, () => process.exit(1));
}

/**
 * Starts a program in a process group of its own, so that a Ctrl-C in the terminal reaches it only through us, once.
 * @param {object} options
 * @param {string} options.command
 * @param {string[]} options.args
 * @param {NodeJS.ProcessEnv} [options.env] in place of this process's environment
 * @param {(text: string) => void} [options.onOutput] what it writes on stdout
 * @param {(text: string) => void} [options.onErrors] what it writes on stderr
 * @returns {Child}
 */
export function startChild({ command, args, env, onOutput, onErrors }) {
  const child = spawn(command, args, {
    cwd: projectFolder,
    env: env ?? process.env,
    detached: true,
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  const pid = child.pid ?? 0;
  child.stdout.setEncoding('utf8').on('data', (text) => onOutput?.(text));
  child.stderr.setEncoding('utf8').on('data', (text) => onErrors?.(text));
  /** @type {Promise<Ending>} */
  const ended = new Promise((resolve) => {
    child.on('error', (error) => {
      onErrors?.(`${error.message}\n`);
      children.delete(started);
      resolve({ code: 127, signal: null });
    });
    child.on('close', (code, signal) => {
      children.delete(started);
      resolve({ code, signal });
    });
  });
  /** @type {Child} */
  const started = {
    pid,
    ended,
    stop: (graceMilliseconds) => stopGroup(pid, ended, graceMilliseconds),
  };
  children.add(started);
  return started;
}

/** Asks all programs still running to end, and ends them by force when they have not done so in time. */
export async function stopAllChildren() {
  await Promise.all([...children].map((child) => child.stop(3_000)));
}

/**
 * Asks a group to end, and ends it by force when it has not done so in time.
 * @param {number} group
 * @param {Promise<Ending>} ended
 * @param {number} graceMilliseconds
 */
async function stopGroup(group, ended, graceMilliseconds) {
  signalGroup(group, 'SIGTERM');
  const timer = setTimeout(() => signalGroup(group, 'SIGKILL'), graceMilliseconds);
  const ending = await ended;
  clearTimeout(timer);
  return ending;
}

/**
 * Runs a program to its end.
 * @param {object} options
 * @param {string} options.command
 * @param {string[]} options.args
 * @param {NodeJS.ProcessEnv} [options.env]
 * @param {number} [options.limitMilliseconds] ended by force after this time
 * @param {(text: string) => void} [options.onText] hears all it writes, as it comes
 * @returns {Promise<{ code: number, output: string }>} its exit code (1 when a signal ended it) and all it wrote
 */
export async function runChild({ command, args, env, limitMilliseconds, onText }) {
  let output = '';
  const hear = (/** @type {string} */ text) => {
    output += text;
    onText?.(text);
  };
  const child = startChild({
    command,
    args,
    ...(env && { env }),
    onOutput: hear,
    onErrors: hear,
  });
  const limit = limitMilliseconds
    ? setTimeout(() => {
        hear(`Ended after ${Math.round(limitMilliseconds / 1000)} s without an answer.\n`);
        void child.stop(2_000);
      }, limitMilliseconds)
    : undefined;
  const { code } = await child.ended;
  clearTimeout(limit);
  return { code: code ?? 1, output };
}

/**
 * @param {number} group
 * @param {NodeJS.Signals} signal
 */
function signalGroup(group, signal) {
  if (group === 0) return;
  try {
    process.kill(-group, signal);
  } catch {
    // The group has ended by itself.
  }
}
