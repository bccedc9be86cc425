// @ts-check
import { createWriteStream } from 'node:fs';
import { Refusal } from '../begin/refusal.mjs';
import { startChild } from '../machine/child.mjs';

/** @typedef {import('../machine/child.mjs').Child & { ready: Record<string, unknown>, keepLog: (file: string) => void }} Program */

/**
 * Starts one of our programs and waits for its line `READY {…}`.
 * @param {object} options
 * @param {string} options.name for sentences
 * @param {string[]} options.args of Node
 * @param {NodeJS.ProcessEnv} options.env
 * @returns {Promise<Program>}
 * @throws {Refusal} with its own sentence when it refuses, else with its last words
 */
export async function startProgram({ name, args, env }) {
  const log = createHeldLog();
  /** @type {(ready: Record<string, unknown>) => void} */
  let markReady = () => {};
  /** @type {Promise<Record<string, unknown>>} */
  const ready = new Promise((resolve) => {
    markReady = resolve;
  });
  let output = '';
  const child = startChild({
    command: process.execPath,
    args,
    env,
    onOutput: (text) => {
      output += text;
      const line = /^READY (.*)$/m.exec(output);
      if (line?.[1] && output.endsWith('\n')) markReady(JSON.parse(line[1]));
    },
    onErrors: (text) => log.write(text),
  });
  const first = await Promise.race([ready, child.ended.then(() => undefined)]);
  if (!first) throw new Refusal(explainRefusedStart(name, log.heldText()));
  return { ...child, ready: first, keepLog: log.keep };
}

/** Holds what a program says until it is known where to keep it. */
function createHeldLog() {
  let held = '';
  /** @type {import('node:fs').WriteStream | undefined} */
  let file;
  return {
    heldText: () => held,
    write: (/** @type {string} */ text) => {
      if (file) file.write(text);
      else held += text;
    },
    keep: (/** @type {string} */ path) => {
      file = createWriteStream(path, { flags: 'a' });
      file.write(held);
      held = '';
    },
  };
}

/**
 * @param {string} name
 * @param {string} said on stderr
 */
function explainRefusedStart(name, said) {
  const refused = /^REFUSED (.*)$/m.exec(said)?.[1];
  if (refused) return refused;
  const taken = /EADDRINUSE.*:(\d+)/.exec(said)?.[1];
  if (taken) return `Port ${taken} is taken by another program, and ${name} needs it: ${portAdvice}`;
  return `No start: ${name} ended at once. Its last words:\n${said.trimEnd().split('\n').slice(-20).join('\n')}`;
}

const portAdvice = 'end that program, or choose others with FAKES_HTTP_PORT and FAKES_SMTP_PORT.';
