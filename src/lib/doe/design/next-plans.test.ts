import { describe, expect, test } from 'vitest';
import { buildBrief, choiceFactor, numberFactor } from '../../../../tests/builders/brief.ts';
import type { Brief } from '../brief.ts';
import { layOutAddedRuns, layOutRuns } from './lay-out-runs.ts';
import { moveWindow } from './move-window.ts';
import { listNextPlans } from './next-plans.ts';
import { proposePlans } from './propose-plans.ts';

function runFirst(brief: Brief, runs: number) {
  const plan = proposePlans(brief).find((proposal) => proposal.runs === runs);
  return plan ? layOutRuns(brief, plan, 5) : [];
}

const withRoom = (settings: number, maxRuns: number) => buildBrief(settings, { budget: { maxRuns } });

describe('after resolution III', () => {
  const brief = withRoom(7, 12);
  const done = runFirst(brief, 12);
  const plans = listNextPlans(brief, done);

  test('all signs turned round unties every main effect: 2^(7-4) becomes resolution IV (Box & Hunter 1961)', () => {
    const fold = plans.find(({ kind }) => kind === 'fold-over');
    expect(fold?.unties).toEqual(['A', 'B', 'C', 'D', 'E', 'F', 'G']);
    const mains = fold?.aliases.filter(({ term }) => term.length === 1) ?? [];
    expect(mains).toHaveLength(7);
    expect(mains.every(({ with: partners }) => partners.every(({ term }) => term.length > 2))).toBe(true);
  });

  test('the new session is a block with middles of its own and new points to look at', () => {
    const fold = plans.find(({ kind }) => kind === 'fold-over');
    expect(fold?.added.filter((row) => row.center).length).toBeGreaterThanOrEqual(2);
    expect(fold?.newCombinations).toHaveLength(8);
    expect(fold?.errorPlan.rung).toMatch(/^replicates/);
    const added = layOutAddedRuns(brief, fold?.added ?? [], 9, done);
    expect(added[0]).toMatchObject({ order: 13, block: 2, center: true });
    expect(new Set(added.map((run) => run.block))).toEqual(new Set([2]));
    expect(Math.min(...added.map((run) => run.standard))).toBe(13);
  });
});

describe('after resolution IV', () => {
  const brief = withRoom(4, 12);
  const done = runFirst(brief, 12);

  test('turning all signs round repeats the same runs, so it is not offered', () => {
    expect(listNextPlans(brief, done).map(({ kind }) => kind)).toEqual(['repeat']);
  });

  test('turning one setting round unties the pair that is asked for, half of it costs half', () => {
    const plans = listNextPlans(brief, done, { untie: 'AB' });
    const whole = plans.find(({ kind }) => kind === 'fold-on-one');
    const half = plans.find(({ kind }) => kind === 'half-fold');
    expect(whole?.unties).toEqual(['AB', 'AC', 'AD', 'BC', 'BD', 'CD']);
    expect(whole?.aliases).toEqual([]);
    expect(half?.unties).toContain('AB');
    expect(half?.added.filter((row) => !row.center)).toHaveLength(4);
  });

  test('in 2^(6-2) only some pairs come free, and they are the ones named', () => {
    const six = withRoom(6, 20);
    const first = runFirst(six, 19);
    const fold = listNextPlans(six, first, { untie: 'BD' }).find(({ kind }) => kind === 'fold-on-one');
    expect(fold?.unties).toContain('BD');
    for (const term of fold?.unties ?? []) {
      const partners = fold?.aliases.find((alias) => alias.term === term)?.with ?? [];
      expect(partners.filter((partner) => partner.term.length <= 2)).toEqual([]);
    }
  });
});

describe('the curve', () => {
  const brief = buildBrief(0, {
    factors: [numberFactor('a'), numberFactor('b'), choiceFactor('c', { usual: 'high' })],
    budget: { maxRuns: 20 },
  });
  const done = runFirst(brief, proposePlans(brief)[0]?.runs ?? 0);

  test('is followed only once the bend is sure, on the faces of the tested range', () => {
    expect(listNextPlans(brief, done).some(({ kind }) => kind === 'axial')).toBe(false);
    const axial = listNextPlans(brief, done, { bendIsSure: true }).find(({ kind }) => kind === 'axial');
    const points = axial?.added.filter((row) => !row.center).map((row) => row.x) ?? [];
    expect(points).toHaveLength(4);
    expect(points.every((x) => x.every((value) => Math.abs(value) <= 1))).toBe(true);
    expect(axial?.newCombinations).toHaveLength(4);
    expect(axial?.errorPlan.highOrderTerms).toEqual([]);
  });
});

describe('rules and hard settings', () => {
  test('added runs never enter what a rule forbids', () => {
    const brief = buildBrief(5, { forbidden: [{ A: 1, B: 1 }], budget: { maxRuns: 40 } });
    for (const plan of proposePlans(brief)) {
      for (const next of listNextPlans(brief, layOutRuns(brief, plan, 2), { bendIsSure: true, untie: 'CD' }))
        expect(next.added.filter(({ x }) => (x[0] ?? 0) > 0 && (x[1] ?? 0) > 0)).toEqual([]);
    }
  });

  test('added runs of a trial in whole plots come in whole plots', () => {
    const factors = [
      numberFactor('oven', { hardToChange: true, settleMinutes: 30 }),
      ...['b', 'c', 'd'].map((name) => numberFactor(name)),
    ];
    const brief = buildBrief(0, { factors, budget: { maxRuns: 24, minutesPerRun: 5 } });
    const plan = proposePlans(brief).find(({ wholePlots }) => wholePlots !== undefined);
    const done = plan ? layOutRuns(brief, plan, 4) : [];
    const repeat = listNextPlans(brief, done).find(({ kind }) => kind === 'repeat');
    const plots = new Map((repeat?.added ?? []).map((row) => [row.wholePlot, row.x[0]]));
    expect(
      (repeat?.added ?? []).every(
        (row) => row.wholePlot !== undefined && plots.get(row.wholePlot) === row.x[0],
      ),
    ).toBe(true);
  });
});

describe('moving the window', () => {
  const brief = buildBrief(0, {
    factors: [
      numberFactor('jaw', { max: 165, step: 1 }),
      numberFactor('dwell', { low: 0.8, high: 1, usual: 0.9, step: 0.05 }),
      choiceFactor('film'),
    ],
  });

  test('keeps widths, the machine’s limits and the dial’s steps', () => {
    const [jaw, dwell, film] = moveWindow(brief, [1, -0.6, 1]).factors;
    expect(jaw).toMatchObject({ low: 145, high: 165, usual: 150 });
    expect(dwell).toMatchObject({ low: 0.75, high: 0.95, usual: 0.9 });
    expect(film).toEqual(brief.factors[2]);
  });

  test('does not bring the new middle into what a rule meant', () => {
    const ruled = { ...brief, forbidden: [{ A: 1, B: 1 }] } satisfies Brief;
    const [jaw, dwell] = moveWindow(ruled, [0.25, 0.5, 0]).factors;
    expect(jaw).toMatchObject({ low: 140, high: 160 });
    expect(dwell).toMatchObject({ low: 0.85, high: 1.05 });
    const withChoice = { ...brief, forbidden: [{ A: 1, C: 1 }] } satisfies Brief;
    expect(moveWindow(withChoice, [0.5, 0, 0]).factors[0]).toMatchObject({ low: 140, high: 160 });
  });

  test('wants one step for each setting', () => {
    expect(() => moveWindow(brief, [1])).toThrow(/moveWindow: steps/);
  });
});
