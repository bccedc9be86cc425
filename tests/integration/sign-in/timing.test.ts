import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { demoSignIns } from '../../../src/server/demo-sign-ins.ts';
import { type RunningApp, startApp } from '../../setup/running-app.ts';
import { Visitor } from '../../setup/visitor.ts';

const [dana] = demoSignIns;
const pairs = 100;
const warmUp = 5;
let running: RunningApp;
beforeAll(async () => {
  running = await startApp({ env: { TRUST_PROXY: 'yes' } });
}, 60_000);
afterAll(() => running.stop());

function median(values: number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? Number.NaN;
}

/** Milliseconds that a refused sign-in takes, each from a network of its own so that none meets the limit. */
async function timeRefusal(email: string, network: string): Promise<number> {
  const began = performance.now();
  const answer = await new Visitor(running.url, network).signIn(email, 'not the right password');
  await answer.arrayBuffer();
  expect(answer.status).toBe(422);
  return performance.now() - began;
}

describe('the time of a refused sign-in', () => {
  it('does not tell whether the address exists', { timeout: 120_000 }, async () => {
    const known: number[] = [];
    const unknown: number[] = [];
    for (let pair = 0; pair < pairs + warmUp; pair += 1) {
      // In turn and each first every other time, so that a slow spell of the machine falls on both.
      const tries = [
        { times: known, email: dana.email, network: `203.0.113.${pair}` },
        { times: unknown, email: `nobody${pair}@harrowlane.example`, network: `198.51.100.${pair}` },
      ];
      for (const { times, email, network } of pair % 2 === 0 ? tries : tries.reverse()) {
        const taken = await timeRefusal(email, network);
        if (pair >= warmUp) times.push(taken);
      }
    }
    const difference = Math.abs(median(known) - median(unknown)) / median(unknown);
    expect(difference, `medians ${median(known)} and ${median(unknown)} ms`).toBeLessThan(0.15);
  });
});
