import { expect, it } from 'vitest';
import { runWhileKilled } from '../../bench/texts/killed-often.ts';

it('loses nothing and sends nothing twice while web and worker are killed twenty times', {
  timeout: 660_000,
}, async () => {
  const outcome = await runWhileKilled({
    kills: 20,
    trials: 46,
    seed: 20_261_201,
    limitMilliseconds: 600_000,
  });
  expect(outcome.kills).toEqual({ web: 8, worker: 12 });
  expect(outcome.runs).toBeGreaterThan(500);
  expect(outcome).toMatchObject({ reached: outcome.runs, keptOnce: outcome.runs, keptBesides: 0 });
  // The service's list settles what a dead worker had in hand, so that not even these go out again.
  expect(outcome.duplicates).toBe(0);
  // The killing hit something, or the test would prove nothing.
  expect(outcome.missed).toBeGreaterThan(0);
});
