import { describe, expect, test } from 'vitest';
import { buildBrief, choiceFactor, numberFactor } from '../../../../tests/builders/brief.ts';
import { layOutRuns } from './lay-out-runs.ts';
import { proposePlans } from './propose-plans.ts';
import { countTimeAndMoney, expectTimeAndMoney } from './time-and-money.ts';

const brief = buildBrief(0, {
  factors: [
    numberFactor('oven', { settleMinutes: 30, discardParts: 10 }),
    numberFactor('speed', { settleMinutes: 5 }),
    choiceFactor('film', { discardParts: 4 }),
  ],
  response: { name: 'y', unit: 'N', kind: 'measured', goal: 'more', worthHaving: 3, partsPerRun: 2 },
  budget: { maxRuns: 20, minutesPerRun: 10, costPerRun: 6 },
});

describe('time and money of a known order', () => {
  test('count each wait once, the longest where several settings change together', () => {
    // From today (0, 0, -1): oven and speed change (30 min, 10 parts), then speed alone (5 min), then nothing, then film (4 parts).
    const order = [
      [-1, -1, -1],
      [-1, 1, -1],
      [-1, 1, -1],
      [-1, 1, 1],
    ];
    expect(countTimeAndMoney(brief, order)).toEqual({ minutes: 4 * 10 + 35, cost: 4 * 6 + 14 * 3 });
  });

  test('say nothing where the brief does not', () => {
    const silent = { ...brief, budget: { maxRuns: 20 } };
    expect(countTimeAndMoney(silent, [[1, 1, 1]])).toEqual({});
  });
});

describe('time and money before there is an order', () => {
  test('are the average of the orders that are drawn', () => {
    const [plan] = proposePlans(brief);
    const rows = plan?.layout ?? [];
    const seeds = 2000;
    let minutes = 0;
    for (let seed = 0; seed < seeds; seed++)
      minutes +=
        countTimeAndMoney(
          brief,
          (plan ? layOutRuns(brief, plan, seed) : []).map((run) => run.coded),
        ).minutes ?? 0;
    const expected = expectTimeAndMoney(brief, rows).minutes ?? 0;
    // Middles stand apart and orders that rise with time are redrawn, which the average over all orders does not know.
    expect(Math.abs(minutes / seeds / expected - 1)).toBeLessThan(0.05);
  });

  test('are less in whole plots, whose hard setting seldom changes', () => {
    const hard = {
      ...brief,
      factors: brief.factors.with(0, numberFactor('oven', { settleMinutes: 30, hardToChange: true })),
    };
    const proposals = proposePlans({ ...hard, budget: { ...brief.budget, maxRuns: 24 } });
    const perRun = (grouped: boolean) =>
      Math.max(
        ...proposals
          .filter(({ wholePlots }) => (wholePlots !== undefined) === grouped)
          .map(({ minutes = 0, runs }) => minutes / runs),
      );
    expect(perRun(true)).toBeLessThan(perRun(false));
  });
});
