import { describe, expect, test } from 'vitest';
import { anyBrief, buildBrief, numberFactor } from '../../../../tests/builders/brief.ts';
import { fc } from '../../../../tests/setup/seeded-properties.ts';
import { countForbidden, isForbidden } from './forbidden.ts';
import { hardestRuns } from './hardest-runs.ts';
import { layOutRuns } from './lay-out-runs.ts';
import { listCorners } from './list-corners.ts';
import { proposePlans } from './propose-plans.ts';

const brief = buildBrief(0, {
  factors: [
    numberFactor('jaw', { harderEnd: 'high' }),
    numberFactor('dwell', { harderEnd: 'low' }),
    numberFactor('press'),
  ],
});
const plans = [12, 40].flatMap((maxRuns) => proposePlans({ ...brief, budget: { maxRuns } }));
const layOut = (replicates: number, seed = 4) => {
  const plan = plans.find((proposal) => proposal.baseRuns === 8 && proposal.replicates === replicates);
  if (plan === undefined) throw new Error('no plan');
  return layOutRuns(brief, plan, seed);
};

describe('the hardest runs', () => {
  test('are the corners with most settings at their harder end, in run order', () => {
    const runs = layOut(1);
    const hardest = runs.filter((run) => run.group.startsWith('+-')).map(({ order }) => order);
    expect(hardestRuns(brief, runs)).toEqual(hardest.map((order) => ({ order, hardness: 2 })));
    expect(hardest).toHaveLength(2);
  });

  test('name a repeated combination once, by its first run', () => {
    const runs = layOut(2);
    const found = hardestRuns(brief, runs);
    expect(found).toHaveLength(2);
    for (const { order } of found) {
      const run = runs.find((candidate) => candidate.order === order);
      expect(runs.find((candidate) => candidate.group === run?.group)).toBe(run);
    }
  });

  test('go on to the next hardest, all of them, while there is only one', () => {
    const all = { factors: brief.factors.map((factor) => ({ ...factor, harderEnd: 'high' as const })) };
    const found = hardestRuns(all, layOut(1));
    expect(found.map(({ hardness }) => hardness)).toEqual([3, 2, 2, 2]);
    const orders = found.slice(1).map(({ order }) => order);
    expect(orders).toEqual(orders.toSorted((first, second) => first - second));
  });

  test('are six at most unless asked otherwise, and the earliest where all are alike', () => {
    const alike = { factors: brief.factors.map(({ harderEnd: _, ...factor }) => factor) };
    const runs = layOut(1);
    const corners = runs.filter((run) => !run.center).map(({ order }) => order);
    expect(hardestRuns(alike, runs)).toEqual(corners.slice(0, 6).map((order) => ({ order, hardness: 0 })));
    expect(hardestRuns(alike, runs, 2)).toHaveLength(2);
    expect(hardestRuns(alike, [])).toEqual([]);
  });
});

describe('what a rule rules out', () => {
  test('is counted over all corners', () => {
    expect(countForbidden(brief.factors, { A: 1, B: 1 })).toEqual({ ruledOut: 2, corners: 8 });
    expect(countForbidden(brief.factors, { A: 1, B: 1, C: -1 })).toEqual({ ruledOut: 1, corners: 8 });
    expect(countForbidden(brief.factors, {})).toEqual({ ruledOut: 0, corners: 8 });
    expect(countForbidden(brief.factors, { D: 1 })).toEqual({ ruledOut: 0, corners: 8 });
  });

  test('agrees with what layouts may not hold', () => {
    fc.assert(
      fc.property(anyBrief({ rules: 2 }), ({ factors, forbidden }) => {
        for (const rule of forbidden) {
          const corners = listCorners(factors.length).filter((x) => isForbidden({ forbidden: [rule] }, x));
          expect(countForbidden(factors, rule).ruledOut).toBe(corners.length);
          expect(corners.length).toBe(2 ** (factors.length - Object.keys(rule).length));
        }
      }),
      { numRuns: 60 },
    );
  });
});
