// @ts-check
import { Refusal } from '../begin/refusal.mjs';
import { leavingSignals, stopAllChildren } from '../machine/child.mjs';
import { RunningTally } from './tally.mjs';

/**
 * @typedef {import('./tally.mjs').Tally} Tally
 * @typedef {{ name: string, run: () => Promise<Tally>, essential?: boolean }} Step essential: without it the rest cannot run
 */

/**
 * Runs the steps one after the other and prints how long each took. The exit code is 0 only with no failure.
 * @param {(Step | Step[][])[]} steps where lanes stand, the lanes run side by side, the steps of a lane one after the other
 */
export async function runSteps(steps) {
  const tally = new RunningTally();
  for (const signal of leavingSignals) process.on(signal, () => void leave(signal));
  const start = Date.now();
  for (const step of steps) {
    const lanes = Array.isArray(step) ? step : [[step]];
    const ended = await Promise.all(lanes.map((lane) => runLane(lane, tally)));
    if (ended.includes('cannot go on')) break;
  }
  console.log(`  ${'all steps'.padEnd(12)} ${formatSeconds(Date.now() - start).padStart(36)}`);
}

/**
 * @param {Step[]} lane
 * @param {RunningTally} tally
 * @returns {Promise<'done' | 'cannot go on'>}
 */
async function runLane(lane, tally) {
  for (const step of lane) {
    tally.open(step.name);
    const start = Date.now();
    const counted = await runStep(step);
    if (isLeaving) process.exit(1);
    tally.add(step.name, counted);
    console.log(`  ${describeStep(step.name, counted, Date.now() - start)}`);
    if (step.essential && counted.failed > 0) return 'cannot go on';
  }
  return 'done';
}

/**
 * @param {Step} step
 * @returns {Promise<Tally>}
 */
async function runStep(step) {
  try {
    return await step.run();
  } catch (error) {
    console.error(error instanceof Refusal ? error.message : error);
    return { passed: 0, failed: 1 };
  }
}

let isLeaving = false;

/**
 * Ends what runs, then the process; asked a second time, it no longer waits.
 * @param {NodeJS.Signals} signal
 */
async function leave(signal) {
  console.log(`  ended by ${signal}`);
  if (!isLeaving) {
    isLeaving = true;
    await stopAllChildren();
  }
  process.exit(1);
}

/**
 * @param {string} name
 * @param {Tally} counted
 * @param {number} milliseconds
 */
function describeStep(name, { passed, failed }, milliseconds) {
  const counts = `${String(passed).padStart(5)} passed ${String(failed).padStart(5)} failed`;
  return `${name.padEnd(12)} ${counts} ${formatSeconds(milliseconds).padStart(10)}`;
}

/** @param {number} milliseconds */
function formatSeconds(milliseconds) {
  return `${(milliseconds / 1000).toFixed(1)} s`;
}
