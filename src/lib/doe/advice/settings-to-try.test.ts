import { describe, expect, it } from 'vitest';
import { regularPlan } from '../../../../tests/builders/random-process.ts';
import { middles, wobble } from '../../../../tests/builders/read-trial.ts';
import {
  buildBrief,
  buildInput,
  buildResult,
  numberFactor,
} from '../../../../tests/builders/simulated-trial.ts';
import { resultsOf, trialOf } from '../../../../tests/builders/verdict-cases.ts';
import type { Brief } from '../brief.ts';
import { bestBet } from './best-bet.ts';
import { settingsToTry } from './settings-to-try.ts';

const points = [...regularPlan(4, []), ...middles(4, 4)];
const usualAtLow = [0, 1, 2, 3].map((place) => numberFactor(place, { usual: -1 }));

function read(brief: Brief, truth: (x: readonly number[]) => number, seed: number, sd: number) {
  const noise = wobble(seed, sd);
  const input = buildInput(
    brief,
    points.map((x) => ({ x, y: truth(x) + noise() })),
  );
  return [buildResult(brief.response, input)];
}

const at = (x: readonly number[], place: number) => x[place] ?? 0;

describe('settingsToTry', () => {
  it('leaves settings as they are that make no real difference, where the best bet would move them', () => {
    const trial = trialOf('strong');
    const results = resultsOf(trial);
    expect(bestBet(trial.brief, results).actual).toEqual([160, 1, 4, 'Supplier B']);
    const bet = settingsToTry(trial.brief, results);
    expect(bet.actual).toEqual([160, 1, 3, 'Supplier A']);
    expect(bet.reasons).toContainEqual({ kind: 'stays-as-it-is', values: {}, refs: { factors: ['C', 'D'] } });
  });

  it.each([1, 2, 3, 4, 5, 6])('gives up at most half of what is worth having (luck %i)', (seed) => {
    const brief = buildBrief(usualAtLow);
    const results = read(brief, (x) => 30 + 2 * at(x, 0) + 0.2 * at(x, 1) + 0.15 * at(x, 2), seed, 0.3);
    const best = bestBet(brief, results);
    const tried = settingsToTry(brief, results);
    expect(tried.coded[0]).toBe(1);
    expect(tried.versusUsual).toBeGreaterThan(best.versusUsual - 0.5 - 1e-9);
    expect(tried.versusUsual).toBeLessThanOrEqual(best.versusUsual + 1e-9);
  });

  it('does not add up small gains until a gain worth having is given away', () => {
    const brief = buildBrief(usualAtLow);
    const results = read(brief, (x) => 30 + 0.35 * (at(x, 0) + at(x, 1) + at(x, 2) + at(x, 3)), 11, 0.05);
    // Each of the four brings .7 of W = 1: none is put back, for all of them bring almost three times W.
    expect(settingsToTry(brief, results).coded).toEqual([1, 1, 1, 1]);
  });

  it('moves a setting that matters only together with another', () => {
    const brief = buildBrief([
      numberFactor(0, { usual: 1 }),
      numberFactor(1, { usual: -1 }),
      numberFactor(2, { usual: -1 }),
      numberFactor(3, { usual: -1 }),
    ]);
    const results = read(brief, (x) => 30 + 2 * at(x, 0) + 2 * at(x, 0) * at(x, 1), 5, 0.2);
    expect(settingsToTry(brief, results).coded.slice(0, 2)).toEqual([1, 1]);
  });

  it('is the best bet where nobody said what a gain is worth', () => {
    const { worthHaving: _, ...response } = buildBrief(4).response;
    const brief = buildBrief(usualAtLow, { response });
    const results = read(brief, (x) => 30 + 2 * at(x, 0) + 0.2 * at(x, 1), 3, 0.1);
    expect(settingsToTry(brief, results)).toEqual(bestBet(brief, results));
  });

  it('loses no limit for the sake of staying', () => {
    const brief = buildBrief(usualAtLow, {
      response: { ...buildBrief(4).response, worthHaving: 4, lower: 33.4 },
    });
    const results = read(brief, (x) => 30 + 3 * at(x, 0) + 0.6 * at(x, 1), 7, 0.05);
    const bet = settingsToTry(brief, results);
    expect(bet.coded[1]).toBe(1);
    expect(bet.main.limitProbability).toBeGreaterThan(0.9);
  });

  it('meets a target as nearly with fewer moves', () => {
    const brief = buildBrief(usualAtLow, {
      response: { ...buildBrief(4).response, goal: 'target', target: 36, worthHaving: 1 },
    });
    const results = read(brief, (x) => 35 + 3 * at(x, 0) + 0.05 * at(x, 3), 13, 0.1);
    const bet = settingsToTry(brief, results);
    expect(bet.predicted).toBeCloseTo(36, 0);
    expect(bet.coded.slice(1)).toEqual([-1, -1, -1]);
  });
});
