import { describe, expect, test } from 'vitest';
import { anyBrief, buildBrief, choiceFactor, numberFactor } from '../../../../tests/builders/brief.ts';
import { fc } from '../../../../tests/setup/seeded-properties.ts';
import { chiSquareUpperTail } from '../distributions/chi-square.ts';
import { encode } from './dial.ts';
import { isForbidden } from './forbidden.ts';
import { groupBy } from './group-by.ts';
import { layOutRuns } from './lay-out-runs.ts';
import { PlanError } from './plan-error.ts';
import { proposePlans } from './propose-plans.ts';
import { steepestCorrelation } from './run-order.ts';

const brief = buildBrief(4, { budget: { maxRuns: 12 } });
const [plan] = proposePlans(brief);
if (plan === undefined) throw new Error('no plan');

const anySeed = fc.integer({ min: 0, max: 2 ** 40 });

/** Some plan of some brief, laid out; nothing where no plan fits. */
const anyLayout = fc
  .record({ anyOne: anyBrief({ rules: 3 }), place: fc.nat(3), seed: anySeed })
  .map(({ anyOne, place, seed }) => {
    try {
      const proposals = proposePlans(anyOne);
      const proposal = proposals[place % proposals.length];
      return proposal && { brief: anyOne, proposal, runs: layOutRuns(anyOne, proposal, seed) };
    } catch (error) {
      if (error instanceof PlanError) return undefined;
      throw error;
    }
  });

describe('the order of running', () => {
  test('comes from the seed alone', () => {
    fc.assert(
      fc.property(anySeed, (seed) => {
        expect(layOutRuns(brief, plan, seed)).toEqual(layOutRuns(brief, plan, seed));
      }),
      { numRuns: 20 },
    );
    expect(layOutRuns(brief, plan, 1)).not.toEqual(layOutRuns(brief, plan, 2));
  });

  test('over 10,000 seeds each corner stands equally often at each corner place', () => {
    const counts = new Map<string, number>();
    const seeds = 10_000;
    for (let seed = 0; seed < seeds; seed++)
      for (const run of layOutRuns(brief, plan, seed))
        if (!run.center)
          counts.set(`${run.standard} ${run.order}`, (counts.get(`${run.standard} ${run.order}`) ?? 0) + 1);
    const cells = 8 * 8;
    expect(counts.size).toBe(cells);
    const expected = (seeds * 8) / cells;
    const chiSquare = [...counts.values()].reduce(
      (sum, count) => sum + (count - expected) ** 2 / expected,
      0,
    );
    expect(chiSquareUpperTail(chiSquare, 7 * 7)).toBeGreaterThan(1e-4);
  });

  test('has every run of the layout once, blocks one after the other, whole plots in one piece', () => {
    fc.assert(
      fc.property(anyLayout, (laidOut) => {
        if (laidOut === undefined) return;
        const { proposal, runs } = laidOut;
        expect(runs.map((run) => run.order)).toEqual(runs.map((_, index) => index + 1));
        expect(runs.map((run) => run.standard).sort((a, b) => a - b)).toEqual(
          proposal.layout.map((_, index) => index + 1),
        );
        expect(runs.map((run) => run.block)).toEqual(runs.map((run) => run.block).toSorted((a, b) => a - b));
        const plots = runs.map((run) => run.wholePlot ?? 0);
        expect(plots).toEqual(plots.toSorted((a, b) => a - b));
        expect(new Set(runs.map((run) => run.block)).size).toBe(proposal.blocks);
        if (proposal.wholePlots !== undefined) expect(new Set(plots).size).toBe(proposal.wholePlots);
      }),
      { numRuns: 60 },
    );
  });

  test('never lets a setting rise or fall with time by more than a correlation of .7, whole plots exempt', () => {
    fc.assert(
      fc.property(anyLayout, (laidOut) => {
        if (laidOut === undefined || laidOut.proposal.wholePlots !== undefined) return;
        expect(steepestCorrelation(laidOut.runs.map((run) => run.coded))).toBeLessThanOrEqual(0.7);
      }),
      { numRuns: 60 },
    );
  });

  test('starts and ends each block with a middle and never bunches them', () => {
    fc.assert(
      fc.property(anyLayout, (laidOut) => {
        if (
          laidOut === undefined ||
          laidOut.proposal.wholePlots !== undefined ||
          laidOut.proposal.centerPoints === 0
        )
          return;
        for (const block of groupBy(laidOut.runs, (run) => run.block)) {
          const middles = block.map((run) => run.center);
          expect(middles[0]).toBe(true);
          if (middles.filter(Boolean).length > 1) expect(middles.at(-1)).toBe(true);
          expect(middles.some((isMiddle, place) => isMiddle && middles[place + 1] === true)).toBe(false);
        }
      }),
      { numRuns: 60 },
    );
  });
});

describe('what a run says', () => {
  test('is never a forbidden point, planned or as the dials go', () => {
    fc.assert(
      fc.property(anyLayout, (laidOut) => {
        for (const run of laidOut?.runs ?? []) {
          expect(isForbidden(laidOut?.brief ?? brief, run.coded)).toBe(false);
          const reached = run.actual.map((value, index) =>
            encode(laidOut?.brief.factors[index] ?? numberFactor('none'), value),
          );
          // Dust of the conversion at an exact middle is no step beyond it.
          expect(
            isForbidden(
              laidOut?.brief ?? brief,
              reached.map((value) => (Math.abs(value) < 1e-9 ? 0 : value)),
            ),
          ).toBe(false);
        }
      }),
      { numRuns: 60 },
    );
  });

  test('is in the words of the machine: numbers on the dial, choices by name', () => {
    const demo = buildBrief(0, {
      factors: [
        numberFactor('jaw', { step: 1 }),
        numberFactor('dwell', { low: 0.8, high: 1, usual: 0.8, step: 0.1 }),
        choiceFactor('film'),
      ],
      budget: { maxRuns: 12 },
    });
    const [proposal] = proposePlans(demo);
    const runs = proposal ? layOutRuns(demo, proposal, 3) : [];
    expect(new Set(runs.map((run) => run.actual[0]))).toEqual(new Set([140, 150, 160]));
    expect(new Set(runs.map((run) => run.actual[1]))).toEqual(new Set([0.8, 0.9, 1]));
    expect(new Set(runs.map((run) => run.actual[2]))).toEqual(new Set(['first', 'second']));
    // One choice: as many middles at each of its values.
    expect(
      runs
        .filter((run) => run.center)
        .map((run) => run.group)
        .sort(),
    ).toEqual(['00+', '00+', '00-', '00-']);
  });

  test('a middle that the dial cannot show is planned where the dial can go', () => {
    const coarse = buildBrief(0, {
      factors: [numberFactor('speed', { low: 1, high: 8, usual: 4, step: 1 }), numberFactor('jaw')],
    });
    const [proposal] = proposePlans(coarse);
    const middle = (proposal ? layOutRuns(coarse, proposal, 3) : []).find((run) => run.center);
    expect(middle?.actual).toEqual([4, 150]);
    expect(middle?.coded[0]).toBeCloseTo(-1 / 7, 12);
    expect(middle?.group).toBe('00');
  });
});
