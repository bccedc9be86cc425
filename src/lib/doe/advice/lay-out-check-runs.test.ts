import { describe, expect, it } from 'vitest';
import { buildBrief, numberFactor } from '../../../../tests/builders/simulated-trial.ts';
import { layOutCheckRuns } from './lay-out-check-runs.ts';

const brief = buildBrief([
  numberFactor(0, { low: 140, high: 160, usual: 145, step: 1 }),
  { kind: 'choice', name: 'film', low: 'A', high: 'B', usual: 'low' },
]);

describe('check runs', () => {
  it('come in pairs of one at the best settings and one at usual', () => {
    const runs = layOutCheckRuns(brief, [0.8, 1], 3, 7);
    expect(runs.map(({ order }) => order)).toEqual([1, 2, 3, 4, 5, 6]);
    for (let pair = 0; pair < 3; pair++)
      expect(
        runs
          .slice(2 * pair, 2 * pair + 2)
          .map(({ group }) => group)
          .sort(),
      ).toEqual(['best', 'usual']);
    expect(runs.find(({ group }) => group === 'best')?.actual).toEqual([158, 'B']);
    expect(runs.find(({ group }) => group === 'usual')).toMatchObject({
      coded: [-0.5, -1],
      actual: [145, 'A'],
    });
  });

  it('are drawn from the seed, and either kind comes first about as often', () => {
    expect(layOutCheckRuns(brief, [1, 1], 4, 11)).toEqual(layOutCheckRuns(brief, [1, 1], 4, 11));
    const firsts = Array.from(
      { length: 2_000 },
      (_, seed) => layOutCheckRuns(brief, [1, 1], 1, seed)[0]?.group,
    );
    const best = firsts.filter((group) => group === 'best').length;
    // 5 standard deviations of a fair coin.
    expect(Math.abs(best - 1_000)).toBeLessThan(5 * Math.sqrt(500));
  });

  it('refuse what makes no sense', () => {
    expect(() => layOutCheckRuns(brief, [1, 1], 0, 1)).toThrow(RangeError);
    expect(() => layOutCheckRuns(brief, [1], 3, 1)).toThrow(RangeError);
  });
});
