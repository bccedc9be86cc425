import { describe, expect, test } from 'vitest';
import { buildBrief } from '../../../../tests/builders/brief.ts';
import power from '../../../../tests/fixtures/reference/power.json' with { type: 'json' };
import { analyze } from '../analysis/analyze.ts';
import { createNormalSource } from '../random/normal-numbers.ts';
import { createUniformSource } from '../random/random-numbers.ts';
import { judgeByDegrees, judgeByPseudoError } from './judging.ts';
import { proposePlans } from './propose-plans.ts';

const family = (tests: number) => ({ tests, strata: 1 });

/** Power for an effect of d run-to-run standard deviations in so many corners: the effect has standard error 2 / sqrt(corners). */
const powerAt = (judging: ReturnType<typeof judgeByDegrees>, corners: number, sizes: readonly number[]) =>
  sizes.map((size) => judging.power((size * Math.sqrt(corners)) / 2));

describe('promises on an error with degrees of freedom', () => {
  test('are those of the reference table, for every number of runs and degrees of freedom in it', () => {
    for (const { N, v, deltaOverSigma, power: printed } of power.power)
      expect(powerAt(judgeByDegrees(v, family(7)), N, [deltaOverSigma])[0]).toBeCloseTo(printed, 9);
    for (const { N, v, power: wanted, deltaOverSigma } of power.detectable)
      if (wanted === 0.8)
        expect((judgeByDegrees(v, family(7)).likelySize * 2) / Math.sqrt(N)).toBeCloseTo(deltaOverSigma, 8);
  });

  // 20,000 simulated experiments a cell, in the design notes of the core: within .02.
  test.each([
    ['2^3 + 3 middles, replicates', 2, 8, [0.14, 0.35, 0.6, 0.8], [1, 2, 3, 4]],
    ['2^3 + 3 middles, with ABC', 3, 8, [0.17, 0.48, 0.79, 0.95], [1, 2, 3, 4]],
    ['2^(4-1) + 4 middles', 3, 8, [0.49, 0.8, 0.95], [2, 3, 4]],
    ['2^4 + 3 middles, with high orders', 7, 16, [0.41, 0.93, 1, 1], [1, 2, 3, 4]],
    ['2^(5-1) + 4 middles', 3, 16, [0.28, 0.75, 0.97, 1], [1, 2, 3, 4]],
  ] as const)('agree with simulated experiments: %s', (_name, df, corners, simulated, sizes) => {
    for (const [index, value] of powerAt(judgeByDegrees(df, family(7)), corners, sizes).entries())
      expect(Math.abs(value - (simulated[index] ?? 0))).toBeLessThanOrEqual(0.02);
  });

  test('clear asks for more than likely, and more so the more is tested', () => {
    const [few, many] = [judgeByDegrees(5, family(4)), judgeByDegrees(5, family(11))];
    expect(few.clearSize).toBeGreaterThan(few.likelySize);
    expect(many.clearSize).toBeGreaterThan(few.clearSize);
    expect(many.likelySize).toBe(few.likelySize);
  });

  test('hold in simulated experiments of a plan with a hard setting: clear 8 times in 10', () => {
    const brief = buildBrief(3, { budget: { maxRuns: 20 }, noise: { sd: 1, of: 'runMean', setup: 0.5 } });
    const [first, ...others] = brief.factors;
    const plans = proposePlans({
      ...brief,
      factors: first ? [{ ...first, hardToChange: true }, ...others] : [],
    });
    const plan = plans.find(({ wholePlots }) => wholePlots !== undefined);
    const promised = plan?.detectable.find(({ effect }) => effect === 'easy');
    const normal = createNormalSource(createUniformSource(12));
    const factors = [...'ABC'].map((letter) => ({ letter, kind: 'number' as const }));
    const trials = 4000;
    let found = 0;
    for (let trial = 0; trial < trials; trial++) {
      const plots = new Map<number | undefined, number>();
      const runs = (plan?.layout ?? []).map((run) => {
        const plot = plots.get(run.wholePlot) ?? 0.5 * normal();
        plots.set(run.wholePlot, plot);
        return { ...run, y: plot + normal() + ((run.x[1] ?? 0) * (promised?.clearSize ?? 0)) / 2 };
      });
      if ((analyze({ factors, runs }).terms.find(({ term }) => term === 'B')?.pFamily ?? 1) < 0.05) found++;
    }
    // Standard error of the share: .0063.
    expect(Math.abs(found / trials - 0.8)).toBeLessThan(0.02);
  });

  test('hold in simulated experiments of a proposed plan: likely 8 times in 10', () => {
    const brief = buildBrief(4, { budget: { maxRuns: 12 } });
    const [plan] = proposePlans(brief);
    const size = plan?.detectable[0]?.size ?? 0;
    const normal = createNormalSource(createUniformSource(11));
    const limit = 3.182446305284263; // upper 2.5 % point of t with 3 df, common tables
    const trials = 20_000;
    let found = 0;
    for (let trial = 0; trial < trials; trial++) {
      const readings = (plan?.layout ?? []).map(({ x }) => ((x[1] ?? 0) * size) / 2 + 1.5 * normal());
      const corners = readings.slice(0, 8);
      const middles = readings.slice(8);
      const effect = corners.reduce((sum, y, run) => sum + (y * (plan?.layout[run]?.x[1] ?? 0)) / 4, 0);
      const mean = middles.reduce((sum, y) => sum + y, 0) / middles.length;
      const variance = middles.reduce((sum, y) => sum + (y - mean) ** 2, 0) / (middles.length - 1);
      if (Math.abs(effect) > limit * Math.sqrt(variance / 2)) found++;
    }
    expect(Math.abs(found / trials - 0.8)).toBeLessThan(0.01);
  });
});

describe('promises on pseudo error', () => {
  test('agree with simulated experiments: 2^3 + 3 middles, two active', () => {
    const judging = judgeByPseudoError({ contrasts: 7, replicateDf: 2 });
    expect(judging.assumedActive).toBe(2);
    for (const [index, value] of powerAt(judging, 8, [1, 2, 3, 4]).entries())
      expect(Math.abs(value - ([0.16, 0.47, 0.81, 0.96][index] ?? 0))).toBeLessThanOrEqual(0.02);
  });

  test('take their sizes from the same table as their power', () => {
    for (const contrasts of [7, 12, 14, 15]) {
      for (const replicateDf of [0, 1, 2]) {
        const judging = judgeByPseudoError({ contrasts, replicateDf });
        expect(judging.power(judging.likelySize)).toBeCloseTo(0.8, 9);
        expect(judging.clearSize).toBeGreaterThan(judging.likelySize);
        expect(judging.power(0)).toBeCloseTo(0.05, 2);
        expect(judging.power(1000)).toBeGreaterThan(0.999);
      }
    }
  });
});
