// @ts-check
import { stopAllChildren } from '../machine/child.mjs';

/** An expected failure. Its message is one sentence that says what is wrong and what to do. */
export class Refusal extends Error {}

/**
 * Runs a command to its end, and the programs it started with it. A Refusal becomes its sentence, any other error its
 * stack, both with exit code 1.
 * @param {() => Promise<void>} command
 */
export async function runCommand(command) {
  try {
    await command();
  } catch (error) {
    process.exitCode = 1;
    console.error(error instanceof Refusal ? error.message : error);
  }
  await stopAllChildren();
}
