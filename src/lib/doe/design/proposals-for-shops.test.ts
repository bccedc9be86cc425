import { describe, expect, test } from 'vitest';
import { buildBrief, numberFactor } from '../../../../tests/builders/brief.ts';
import type { Proposal } from './proposal.ts';
import { proposePlans } from './propose-plans.ts';

const kindsOf = (facts: Proposal['warnings'] | undefined) => facts?.map((fact) => fact.kind);

const recommended = (brief: Parameters<typeof proposePlans>[0]) => proposePlans(brief)[0];

describe('hard settings', () => {
  const withHard = (maxRuns: number) =>
    proposePlans(
      buildBrief(0, {
        factors: [
          numberFactor('oven', { hardToChange: true, settleMinutes: 40 }),
          ...['b', 'c', 'd'].map((name) => numberFactor(name)),
        ],
        budget: { maxRuns, minutesPerRun: 5 },
      }),
    );

  test('are declared unjudged with too few whole plots, and full shuffling stands beside', () => {
    const proposals = withHard(16);
    const grouped = proposals.find(({ wholePlots }) => wholePlots !== undefined);
    expect(kindsOf(grouped?.warnings)).toContain('hard-setting-not-judged');
    expect(grouped?.detectable.map(({ effect }) => effect)).toEqual(['easy']);
    expect(proposals.some(({ wholePlots, runs }) => wholePlots === undefined && runs <= 16)).toBe(true);
  });

  test('have two whole plots at each level and a promise of their own where there is room', () => {
    const grouped = withHard(36).find(({ detectable }) => detectable.length === 2);
    const plots = new Map(
      (grouped?.layout ?? []).filter((row) => !row.center).map((row) => [row.wholePlot, row.x[0]]),
    );
    expect([...plots.values()].filter((level) => level === 1).length).toBeGreaterThanOrEqual(2);
    expect([...plots.values()].filter((level) => level === -1).length).toBeGreaterThanOrEqual(2);
    expect(grouped?.detectable.map(({ effect }) => effect)).toEqual(['easy', 'hardToChange']);
    const [easy, hard] = grouped?.detectable ?? [];
    expect(hard?.size).toBeGreaterThan(easy?.size ?? 0);
  });

  test('never change within a whole plot', () => {
    for (const { layout, wholePlots } of withHard(36)) {
      if (wholePlots === undefined) continue;
      const levels = new Map<number | undefined, Set<number | undefined>>();
      for (const row of layout)
        levels.set(row.wholePlot, (levels.get(row.wholePlot) ?? new Set()).add(row.x[0]));
      expect([...levels.values()].every((seen) => seen.size === 1)).toBe(true);
    }
  });
});

describe('rules', () => {
  test('on all settings are met by turning a sign', () => {
    const plan = recommended(
      buildBrief(4, { forbidden: [{ A: 1, B: 1, C: 1, D: 1 }], budget: { maxRuns: 12 } }),
    );
    expect(plan?.generators).toEqual(['D=-ABC']);
    expect(plan?.definingWords).toEqual(['-ABCD']);
  });

  test('on two settings empty a pair: it is named, a narrower range is offered, and main effects stay 60 % as well known', () => {
    const proposals = proposePlans(buildBrief(4, { forbidden: [{ A: 1, B: 1 }] }));
    for (const { warnings, efficiencies, terms, errorPlan, aliases } of proposals) {
      expect(warnings).toContainEqual({
        kind: 'pair-emptied-by-rule',
        values: { rule: 0 },
        refs: { terms: ['AB'] },
      });
      expect(warnings).toContainEqual({
        kind: 'narrow-a-range-first',
        values: { rule: 0, low: 140, high: 150 },
        refs: { factors: ['A'] },
      });
      expect(terms).not.toContain('AB');
      expect(terms.slice(0, 4)).toEqual(['A', 'B', 'C', 'D']);
      for (const { term, relative } of efficiencies ?? [])
        if (term.length === 1) expect(relative).toBeGreaterThanOrEqual(0.6);
      expect(errorPlan.rung).toMatch(/^replicates/);
      expect(errorPlan.df).toBeGreaterThanOrEqual(3);
      expect(aliases.find(({ term }) => term === 'A')?.with.map(({ term }) => term)).toContain('AB');
    }
  });
});

describe('blocks', () => {
  test('hide what matters least, by name, and a block too small is a warning with the smallest fix', () => {
    const blocks = { name: 'film roll', kind: 'batch' as const, count: 2, runsEach: 6 };
    const proposals = proposePlans(buildBrief(4, { blocks, budget: { maxRuns: 24 } }));
    const full = proposals.find(({ baseRuns }) => baseRuns === 16);
    expect(full?.confoundedWithBlocks).toEqual(['ABCD']);
    expect(full?.warnings).toContainEqual({
      kind: 'hidden-by-blocks',
      values: { blocks: 2 },
      refs: { terms: ['ABCD'] },
    });
    expect(full?.warnings).toContainEqual({
      kind: 'block-too-small',
      values: { runsEach: 6, needed: (full?.runs ?? 0) / 2 },
      refs: {},
    });
  });

  test('of whole repeats hide nothing', () => {
    const blocks = { name: 'shift', kind: 'shift' as const, count: 2 };
    const repeated = proposePlans(buildBrief(3, { blocks })).find(({ replicates }) => replicates === 2);
    expect(repeated?.confoundedWithBlocks).toEqual([]);
  });
});

describe('parts and counts', () => {
  test('more parts steady a run but cannot beat its set-up', () => {
    const sizeWith = (partsPerRun: number) => {
      const response = {
        name: 'y',
        unit: 'N',
        kind: 'measured' as const,
        goal: 'more' as const,
        worthHaving: 3,
        partsPerRun,
      };
      return (
        proposePlans(buildBrief(3, { response, noise: { sd: 2, of: 'part' } }))[0]?.detectable[0]?.size ?? 0
      );
    };
    expect(sizeWith(4)).toBeLessThan(sizeWith(1));
    // Set-up assumed at half the spread of parts: sqrt(.25 + 1/m) of it.
    expect(sizeWith(1000) / sizeWith(1)).toBeCloseTo(Math.sqrt(0.251 / 1.25), 6);
  });

  test('rejects are planned on the arcsine scale, and thin lots are a warning with the lot needed', () => {
    const response = {
      name: 'burnt',
      unit: 'pouches',
      kind: 'rejects' as const,
      goal: 'less' as const,
      lotSize: 50,
      usualRate: 0.06,
      worthHaving: 0.04,
    };
    const [plan] = proposePlans(buildBrief(3, { response, noise: null }));
    expect(plan?.warnings).toContainEqual({
      kind: 'few-rejects',
      values: { expected: 3, lotSize: 50, lotNeeded: 84 },
      refs: { results: [0] },
    });
    expect(kindsOf(plan?.warnings)).toContain('counting-noise-only');
    const [wide] = proposePlans(buildBrief(3, { response: { ...response, lotSize: 400 }, noise: null }));
    expect(wide?.powerAtWorthHaving).toBeGreaterThan(plan?.powerAtWorthHaving ?? 1);
    expect(kindsOf(wide?.warnings)).not.toContain('few-rejects');
  });
});
