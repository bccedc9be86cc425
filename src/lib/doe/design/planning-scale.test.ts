import { describe, expect, test } from 'vitest';
import { buildBrief } from '../../../../tests/builders/brief.ts';
import power from '../../../../tests/fixtures/reference/power.json' with { type: 'json' };
import type { Brief, ResponseSpec } from '../brief.ts';
import { createUniformSource } from '../random/random-numbers.ts';
import { choosePlanningScale } from './planning-scale.ts';
import type { Proposal } from './proposal.ts';
import { proposePlans } from './propose-plans.ts';

const { response: measured } = buildBrief(1);

describe('a measured result', () => {
  test('is promised in its own unit: the tabled size times the spread of one run', () => {
    const plan = pickPlan(buildBrief(3, { budget: { maxRuns: 12 }, noise: { sd: 1.5, of: 'runMean' } }));
    const { df } = plan.errorPlan;
    const row = power.detectable.find(({ N, v, power: wanted }) => N === 8 && v === df && wanted === 0.8);
    expect(plan.detectable[0]?.size).toBeCloseTo(1.5 * (row?.deltaOverSigma ?? 0), 7);
  });

  test('in another unit has the same plan with the same power and promises in that unit', () => {
    const inUnit = (factor: number) =>
      buildBrief(4, {
        response: { ...measured, worthHaving: 3 * factor },
        noise: { sd: 1.5 * factor, of: 'part', setup: 0.4 * factor },
      });
    const newtons = proposePlans(inUnit(1));
    for (const [index, plan] of proposePlans(inUnit(1000)).entries()) {
      expect(plan.id).toBe(newtons[index]?.id);
      expect(plan.powerAtWorthHaving).toBeCloseTo(newtons[index]?.powerAtWorthHaving ?? 0, 9);
      for (const [kind, { size }] of plan.detectable.entries())
        expect(size / 1000).toBeCloseTo(newtons[index]?.detectable[kind]?.size ?? 0, 9);
    }
  });

  test('of several parts varies by setting up and by its share of the parts', () => {
    const scaleOf = (noise: Brief['noise'], partsPerRun = 4) =>
      choosePlanningScale(buildBrief(2, { response: { ...measured, partsPerRun }, noise }));
    expect(scaleOf({ sd: 2, of: 'part', setup: 1.5 }).runSd).toBeCloseTo(
      Math.sqrt(1.5 ** 2 + 2 ** 2 / 4),
      12,
    );
    expect(scaleOf({ sd: 2, of: 'part' })).toMatchObject({ runSd: Math.sqrt(1 + 1), assumedSetup: 1 });
    // The spread of run means already holds both.
    expect(scaleOf({ sd: 2, of: 'runMean' })).toMatchObject({ runSd: 2, assumedSetup: null });
    expect(scaleOf(null)).toMatchObject({ unit: 'noise sd', runSd: 1, worthHaving: null });
  });
});

describe('a counted result', () => {
  const rejects: ResponseSpec = {
    name: 'burnt',
    unit: 'pouches',
    kind: 'rejects',
    goal: 'less',
    lotSize: 200,
    usualRate: 0.12,
    worthHaving: 0.08,
  };
  const flaws: ResponseSpec = {
    name: 'specks',
    unit: 'specks',
    kind: 'flaws',
    goal: 'less',
    usualRate: 20,
    worthHaving: 11,
  };
  const trials = 6000;

  /** Experiments in which the first setting alone moves the rate, from today's at one end to `there` at the other; how often its change is likely. */
  function simulate(response: ResponseSpec, plan: Proposal, there: number, seed: number): number {
    const random = createUniformSource(seed);
    const lot = response.lotSize ?? 1;
    const here = response.usualRate ?? 0;
    const isRejects = response.kind === 'rejects';
    // Middles halfway on the scale of the analysis, where nothing bends.
    const halfway = isRejects
      ? Math.sin((Math.asin(Math.sqrt(here)) + Math.asin(Math.sqrt(there))) / 2) ** 2
      : ((Math.sqrt(here) + Math.sqrt(there)) / 2) ** 2;
    const drawAt = (rate: number) => (isRejects ? drawBinomial(lot, rate) : drawPoisson(rate));
    const draw = { '-1': drawAt(here), '0': drawAt(halfway), '1': drawAt(there) };
    const steady = (count: number) =>
      isRejects
        ? Math.asin(Math.sqrt(count / (lot + 1))) + Math.asin(Math.sqrt((count + 1) / (lot + 1)))
        : Math.sqrt(count) + Math.sqrt(count + 1);
    const { df } = plan.errorPlan;
    // Upper 2.5 % points of t with 3 and 4 df, common tables.
    const limit = df === 3 ? 3.18245 : df === 4 ? 2.77645 : Number.NaN;
    let likely = 0;
    for (let trial = 0; trial < trials; trial++) {
      const readings = plan.layout.map(({ x }) =>
        steady(draw[`${x[0] ?? 0}` as keyof typeof draw](random())),
      );
      const corners = readings.slice(0, 8);
      const contrast = (columns: readonly number[]) =>
        corners.reduce(
          (sum, y, run) => sum + y * columns.reduce((sign, c) => sign * (plan.layout[run]?.x[c] ?? 0), 1),
          0,
        ) / 8;
      const middles = readings.slice(8);
      const mean = middles.reduce((sum, y) => sum + y, 0) / middles.length;
      const pure = middles.reduce((sum, y) => sum + (y - mean) ** 2, 0);
      const variance = (pure + 8 * contrast([0, 1, 2]) ** 2) / (df ?? 1);
      if (Math.abs(2 * contrast([0])) > limit * Math.sqrt(variance / 2)) likely++;
    }
    return likely / trials;
  }

  test.each([
    ['rejects, fewer', rejects],
    ['rejects, more', { ...rejects, goal: 'more' as const }],
    ['flaws, fewer', flaws],
  ])(
    '%s: a change of the promised size, in counts, is likely 8 times in 10; W as often as promised',
    (_, response) => {
      const plan = pickPlan(buildBrief(3, { response, noise: null, budget: { maxRuns: 12 } }));
      const [promised] = plan.detectable;
      const towards = response.goal === 'more' ? 1 : -1;
      const usual = response.usualRate ?? 0;
      expect(promised?.unit).toBe('response');
      expect(promised?.size).toBeLessThan(usual * 1.5);
      expect(
        Math.abs(simulate(response, plan, usual + towards * (promised?.size ?? 0), 5) - 0.8),
      ).toBeLessThan(0.025);
      const atWorth = simulate(response, plan, usual + towards * (response.worthHaving ?? 0), 6);
      expect(Math.abs(atWorth - (plan.powerAtWorthHaving ?? 0))).toBeLessThan(0.025);
    },
  );

  test.each([
    ['less', rejects],
    ['more', { ...rejects, goal: 'more' as const }],
    ['flaws', flaws],
  ])('goes to its scale and back at the usual rate: %s', (_, response) => {
    const scale = choosePlanningScale(buildBrief(2, { response, noise: null }));
    expect(scale.toResponse(scale.worthHaving ?? 0)).toBeCloseTo(response.worthHaving ?? 0, 10);
    expect(scale.toResponse(0)).toBeCloseTo(0, 10);
  });

  test('that must meet a target is held to the harder side', () => {
    const worthOf = (goal: ResponseSpec['goal']) =>
      choosePlanningScale(buildBrief(2, { response: { ...rejects, goal, target: 0.1 }, noise: null }))
        .worthHaving ?? 0;
    expect(worthOf('target')).toBe(Math.min(worthOf('less'), worthOf('more')));
  });

  test('that cannot fall so far is promised a size beyond what there is', () => {
    const thin = { ...rejects, lotSize: 20, usualRate: 0.05, worthHaving: 0.04 };
    const plan = pickPlan(buildBrief(3, { response: thin, noise: null, budget: { maxRuns: 12 } }));
    expect(plan.detectable[0]?.size).toBeGreaterThan(0.05);
    expect(plan.powerAtWorthHaving).toBeLessThan(0.5);
  });

  test('varies as counts do, or as the crew saw if that is more', () => {
    const scaleOf = (sd: number | null) =>
      choosePlanningScale(
        buildBrief(2, { response: rejects, noise: sd === null ? null : { sd, of: 'runMean' } }),
      );
    // Binomial spread of a share of 200 at .12, and its steadied scale: 1 / sqrt(n + 1/2).
    const binomial = Math.sqrt((0.12 * 0.88) / 200);
    expect(scaleOf(null).runSd).toBeCloseTo(1 / Math.sqrt(200.5), 12);
    expect(scaleOf(binomial / 3).runSd).toBeCloseTo(1 / Math.sqrt(200.5), 12);
    expect(scaleOf(3 * binomial).runSd).toBeCloseTo(3 / Math.sqrt(200), 12);
  });
});

/** Eight corners, each once, with middles and an error of their own. */
function pickPlan(brief: Brief): Proposal {
  const plan = proposePlans(brief).find(
    ({ baseRuns, replicates, errorPlan }) => baseRuns === 8 && replicates === 1 && errorPlan.df !== null,
  );
  if (plan === undefined) throw new Error('no plan of eight corners');
  return plan;
}

/** Inverse of the distribution of a count, from its probabilities in turn. */
function invert(probabilities: readonly number[]): (u: number) => number {
  return (u) => {
    let below = 0;
    const count = probabilities.findIndex((probability) => {
      below += probability;
      return u < below;
    });
    return count < 0 ? probabilities.length - 1 : count;
  };
}

function drawBinomial(lot: number, rate: number): (u: number) => number {
  const probabilities = [(1 - rate) ** lot];
  for (let count = 1; count <= lot; count++)
    probabilities.push(((probabilities[count - 1] ?? 0) * (lot - count + 1) * rate) / (count * (1 - rate)));
  return invert(probabilities);
}

function drawPoisson(rate: number): (u: number) => number {
  const probabilities = [Math.exp(-rate)];
  for (let count = 1; count <= 10 * rate + 20; count++)
    probabilities.push(((probabilities[count - 1] ?? 0) * rate) / count);
  return invert(probabilities);
}
