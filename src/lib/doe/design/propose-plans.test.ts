import { describe, expect, test } from 'vitest';
import { anyBrief, buildBrief, choiceFactor } from '../../../../tests/builders/brief.ts';
import { fc } from '../../../../tests/setup/seeded-properties.ts';
import type { Brief } from '../brief.ts';
import { factSchema } from '../facts.ts';
import { keepUndominated } from './compare-proposals.ts';
import { PlanError } from './plan-error.ts';
import type { Proposal } from './proposal.ts';
import { proposePlans } from './propose-plans.ts';

function tryPlans(brief: Brief): Proposal[] {
  try {
    return proposePlans(brief);
  } catch (error) {
    if (error instanceof PlanError) return [];
    throw error;
  }
}

const recommended = (brief: Brief) => proposePlans(brief).find((proposal) => proposal.recommended);
const kindsOf = (facts: Proposal['reasons'] | undefined) => facts?.map((fact) => fact.kind);

describe('the proposals for any brief', () => {
  test('are one to four, within every limit, none dominated, one recommended and first', () => {
    let planned = 0;
    fc.assert(
      fc.property(anyBrief({ rules: 2 }), (brief) => {
        const proposals = tryPlans(brief);
        if (proposals.length === 0) return;
        planned++;
        expect(proposals.length).toBeLessThanOrEqual(4);
        expect(proposals.filter((proposal) => proposal.recommended)).toEqual([proposals[0]]);
        expect(keepUndominated(proposals)).toEqual(proposals);
        expect(new Set(proposals.map(({ id }) => id)).size).toBe(proposals.length);
        for (const { runs, layout, minutes, cost } of proposals) {
          expect(layout).toHaveLength(runs);
          expect(runs).toBeLessThanOrEqual(brief.budget.maxRuns);
          expect(minutes ?? 0).toBeLessThanOrEqual(brief.budget.minutes ?? Number.POSITIVE_INFINITY);
          expect(minutes).toBeGreaterThanOrEqual(runs * 10);
          expect(cost).toBeGreaterThanOrEqual(runs * 4);
        }
      }),
      { numRuns: 80 },
    );
    expect(planned).toBeGreaterThan(40);
  });

  test('carry sound facts, finite numbers and a reason for the recommended one', () => {
    fc.assert(
      fc.property(anyBrief({ rules: 2 }), (brief) => {
        for (const proposal of tryPlans(brief)) {
          for (const fact of [...proposal.reasons, ...proposal.warnings])
            expect(factSchema.parse(fact)).toEqual(fact);
          for (const { size, clearSize, range } of proposal.detectable)
            for (const value of [size, clearSize, ...range]) expect(Number.isFinite(value)).toBe(true);
          if (proposal.recommended) expect(proposal.reasons.length).toBeGreaterThan(0);
        }
      }),
      { numRuns: 40 },
    );
  });

  test('rest on small effects only where one more round of middles, or of corners, would not fit', () => {
    fc.assert(
      fc.property(anyBrief({ rules: 0 }), (brief) => {
        const { minutes: _, ...budget } = brief.budget;
        for (const { errorPlan, runs, baseRuns, wholePlots } of tryPlans({ ...brief, budget })) {
          if (!errorPlan.rung.startsWith('pseudo') || wholePlots !== undefined) continue;
          const onlyChoices = brief.factors.every((factor) => factor.kind === 'choice');
          const round = onlyChoices ? baseRuns : 4 * (brief.blocks?.count ?? 1);
          expect(runs + round).toBeGreaterThan(budget.maxRuns);
        }
      }),
      { numRuns: 60 },
    );
  });
});

describe('promises', () => {
  const promiseOf = (sd: number, maxRuns = 20) =>
    tryPlans(buildBrief(4, { noise: { sd, of: 'runMean' }, budget: { maxRuns } }));

  test('fall when noise rises', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.3, max: 5, noNaN: true }),
        fc.double({ min: 1.05, max: 3, noNaN: true }),
        (sd, factor) => {
          const quiet = promiseOf(sd);
          for (const loud of promiseOf(sd * factor)) {
            const same = quiet.find(({ id }) => id === loud.id);
            if (same === undefined) continue;
            expect(loud.powerAtWorthHaving).toBeLessThanOrEqual((same.powerAtWorthHaving ?? 0) + 1e-12);
            expect(loud.detectable[0]?.size).toBeGreaterThan(same.detectable[0]?.size ?? 0);
          }
        },
      ),
      { numRuns: 40 },
    );
  });

  test('rise with room for more runs', () => {
    const best = (runs: number) =>
      Math.max(...promiseOf(2, runs).map(({ powerAtWorthHaving }) => powerAtWorthHaving ?? 0));
    const rooms = [8, 12, 16, 20, 24, 28, 36, 44].map(best);
    expect(rooms).toEqual(rooms.toSorted((first, second) => first - second));
    expect(rooms.at(-1)).toBeGreaterThan(2 * (rooms[0] ?? 1));
  });

  test('give a range for a guessed noise and the noise itself as unit where nobody knows it', () => {
    const [known] = proposePlans(buildBrief(3));
    const [detectable] = known?.detectable ?? [];
    // 80 % chi-square interval with 4 df: sd between .717 and 1.939 of the guess (quantiles 7.779 and 1.064, common tables).
    expect((detectable?.range[0] ?? 0) / (detectable?.size ?? 1)).toBeCloseTo(Math.sqrt(4 / 7.779), 3);
    expect((detectable?.range[1] ?? 0) / (detectable?.size ?? 1)).toBeCloseTo(Math.sqrt(4 / 1.0636), 3);
    const [unknown] = proposePlans(buildBrief(3, { noise: null }));
    expect(unknown?.detectable[0]?.unit).toBe('noise sd');
    expect(unknown?.powerAtWorthHaving).toBeNull();
    expect(kindsOf(unknown?.warnings)).toContain('noise-unknown');
    expect(kindsOf(unknown?.reasons)).toContain('cheapest-with-own-error');
  });
});

describe('the recommendation', () => {
  test('is the cheapest plan that finds W 8 times in 10 with main effects apart', () => {
    const plan = recommended(buildBrief(4, { budget: { maxRuns: 40 } }));
    expect(plan).toMatchObject({
      baseRuns: 16,
      centerPoints: 3,
      runs: 19,
      resolution: Number.POSITIVE_INFINITY,
    });
    expect(plan?.powerAtWorthHaving).toBeGreaterThan(0.8);
    expect(plan?.reasons[0]?.kind).toBe('cheapest-with-power');
  });

  test('is the most power of resolution IV or more where none reaches that', () => {
    const plan = recommended(buildBrief(4, { budget: { maxRuns: 12 } }));
    expect(plan).toMatchObject({ baseRuns: 8, centerPoints: 4, generators: ['D=ABC'], resolution: 4 });
    expect(plan?.reasons[0]?.kind).toBe('most-power-within-limits');
  });

  test('takes resolution III only as a first screen, and says when one thing at a time would do', () => {
    const screen = recommended(buildBrief(7, { budget: { maxRuns: 12 } }));
    expect(screen?.resolution).toBe(3);
    expect(kindsOf(screen?.reasons)).toContain('screen-first');
    expect(kindsOf(screen?.warnings)).toContain('main-effects-tied-to-pairs');
    expect(kindsOf(screen?.warnings)).not.toContain('one-at-a-time-would-do');
    const quiet = recommended(buildBrief(7, { budget: { maxRuns: 12 }, noise: { sd: 0.7, of: 'runMean' } }));
    expect(kindsOf(quiet?.warnings)).toContain('one-at-a-time-would-do');
  });

  test('falls back on small effects for error when the budget forbids a fourth middle', () => {
    const plan = recommended(buildBrief(4, { budget: { maxRuns: 11 } }));
    expect(plan?.errorPlan).toMatchObject({ rung: 'pseudo+replicates', df: null, replicateDf: 2 });
    expect(plan?.detectable[0]?.assumedActive).toBe(2);
    expect(kindsOf(plan?.warnings)).toContain('error-from-small-effects');
  });

  test('repeats plans of choices alone', () => {
    const choices = Array.from({ length: 4 }, (_, index) => choiceFactor(`choice ${index}`));
    for (const { errorPlan, centerPoints } of proposePlans(
      buildBrief(0, { factors: choices, budget: { maxRuns: 32 } }),
    )) {
      expect(errorPlan.rung).toMatch(/^replicates/);
      expect(centerPoints).toBe(0);
    }
  });
});
