import { describe, expect, test } from 'vitest';
import { anyBrief, buildBrief, choiceFactor, numberFactor } from '../../../../tests/builders/brief.ts';
import { fc } from '../../../../tests/setup/seeded-properties.ts';
import type { Fact, FactKind } from '../facts.ts';
import { factSchema } from '../facts.ts';
import { coach } from './coach.ts';
import type { CoachDraft, DraftFactor } from './draft.ts';
import { PlanError } from './plan-error.ts';
import { listBestPlans, proposePlans } from './propose-plans.ts';

const only = (draft: CoachDraft, kind: FactKind): Fact[] => coach(draft).filter((fact) => fact.kind === kind);
const aboutOne = (factor: DraftFactor) => coach({ factors: [factor] });

describe('one setting', () => {
  test('whose low is not below its high is told so, and nothing that would follow from the range', () => {
    expect(aboutOne(numberFactor('jaw', { low: 160, high: 150, step: 20, usual: 10 }))).toEqual([
      { kind: 'low-not-below-high', values: { low: 160, high: 150 }, refs: { factors: ['A'] } },
    ]);
    expect(aboutOne({ kind: 'number', low: 5, high: 5 })[0]?.kind).toBe('low-not-below-high');
  });

  test('of less than four steps of the dial is close to its step', () => {
    expect(aboutOne(numberFactor('jaw', { low: 145, high: 147, usual: 146, step: 1 }))).toEqual([
      {
        kind: 'range-close-to-step',
        values: { low: 145, high: 147, step: 1, leastWidth: 4 },
        refs: { factors: ['A'] },
      },
    ]);
    expect(aboutOne(numberFactor('dwell', { low: 0.1, high: 0.5, usual: 0.3, step: 0.1 }))).toEqual([]);
  });

  test('beyond the machine is told which end and which limit', () => {
    const factor = numberFactor('jaw', { low: 130, high: 170, min: 135, max: 165 });
    expect(aboutOne(factor).map(({ values }) => values)).toEqual([
      { end: 'low', value: 130, limit: 135 },
      { end: 'high', value: 170, limit: 165 },
    ]);
    expect(aboutOne({ high: 170, max: 165 })).toHaveLength(1);
  });

  test('not halfway today is told where the middle runs will be, as the dial can show it', () => {
    expect(aboutOne(numberFactor('jaw', { low: 150, high: 160, usual: 150 }))).toEqual([
      { kind: 'usual-not-halfway', values: { usual: 150, middle: 155 }, refs: { factors: ['A'] } },
    ]);
    const coarse = numberFactor('speed', { low: 1, high: 8, usual: 7, step: 1 });
    expect(aboutOne(coarse)[0]?.values).toEqual({ usual: 7, middle: 4 });
    expect(aboutOne({ ...coarse, usual: 4 })).toEqual([]);
    expect(aboutOne(numberFactor('jaw', { usual: 170 }))[0]?.kind).toBe('usual-outside-range');
  });

  test('that is a choice has no range to speak of', () => {
    expect(aboutOne(choiceFactor('film'))).toEqual([]);
  });
});

describe('settings together', () => {
  const alike = (first: DraftFactor, second: DraftFactor) =>
    only({ factors: [first, second] }, 'settings-alike').map(({ values, refs }) => [values, refs.factors]);

  test('with the same name, also as the panel calls it, look like the same thing', () => {
    const jaw = numberFactor('Jaw temp');
    expect(alike(jaw, numberFactor('jaw-TEMP', { low: 1 }))).toEqual([[{ because: 'name' }, ['A', 'B']]]);
    expect(alike(jaw, numberFactor('sealer', { panelName: 'JAW TEMP' }))).toHaveLength(1);
    expect(alike(jaw, numberFactor('Dwell', { unit: 's' }))).toEqual([]);
    expect(alike({ name: ' ' }, { name: '' })).toEqual([]);
  });

  test('with the same unit and ends do too, unless they stand apart today', () => {
    const speed = numberFactor('speed');
    expect(alike(speed, numberFactor('dwell'))).toEqual([[{ because: 'values' }, ['A', 'B']]]);
    expect(alike(speed, numberFactor('dwell', { unit: 'F' }))).toEqual([]);
    expect(alike(speed, numberFactor('dwell', { usual: 145 }))).toEqual([]);
    expect(alike(choiceFactor('film'), choiceFactor('roll'))).toHaveLength(1);
    expect(alike(choiceFactor('film'), choiceFactor('roll', { high: 'third' }))).toEqual([]);
  });

  test.each([
    [3, 8, { neededToFit: 4, neededApart: 11, mostApart: 2 }],
    [5, 12, { neededToFit: 8, neededApart: 19, mostApart: 4 }],
    [7, 4, { neededToFit: 8, neededApart: 19, mostApart: 0 }],
  ])(
    '%i settings in %i runs are many: how many runs would do, and how many settings',
    (settings, runs, needs) => {
      const draft = { factors: buildBrief(settings).factors, budget: { maxRuns: runs } };
      expect(only(draft, 'many-settings-for-runs').map(({ values }) => values)).toEqual([
        { settings, runs, ...needs },
      ]);
      expect(only({ ...draft, budget: { maxRuns: needs.neededApart } }, 'many-settings-for-runs')).toEqual(
        [],
      );
    },
  );

  test('that need more runs find in the proposals what they are told', () => {
    for (const settings of [3, 4, 5, 6, 7]) {
      const bare = buildBrief(settings, { budget: { maxRuns: 8 } });
      const [fact] = only(bare, 'many-settings-for-runs');
      if (fact?.kind !== 'many-settings-for-runs') throw new Error('no fact');
      const atBest = (maxRuns: number) =>
        Math.max(...proposePlans({ ...bare, budget: { maxRuns } }).map(({ resolution }) => resolution));
      expect(atBest(fact.values.neededApart)).toBeGreaterThanOrEqual(4);
      const withMiddles = proposePlans({ ...bare, budget: { maxRuns: fact.values.neededApart - 1 } }).filter(
        ({ resolution, centerPoints }) => resolution >= 4 && centerPoints >= 3,
      );
      expect(withMiddles).toEqual([]);
      expect(() => proposePlans({ ...bare, budget: { maxRuns: fact.values.neededToFit - 1 } })).toThrow(
        PlanError,
      );
    }
  });
});

describe('results', () => {
  const measured = { kind: 'measured' as const, worthHaving: 3 };

  test('with fewer than five rejects a lot are told the lot that would give five', () => {
    const rejects = { kind: 'rejects' as const, lotSize: 50, usualRate: 0.06 };
    expect(coach({ response: rejects, watch: [{ ...rejects, usualRate: 0 }] })).toEqual([
      { kind: 'few-rejects', values: { expected: 3, lotSize: 50, lotNeeded: 84 }, refs: { results: [0] } },
      { kind: 'few-rejects', values: { expected: 0, lotSize: 50, lotNeeded: null }, refs: { results: [1] } },
    ]);
    expect(coach({ response: { ...rejects, lotSize: 84 } })).toEqual([]);
    expect(coach({ response: { kind: 'rejects', usualRate: 0.06 } })).toEqual([]);
  });

  test('of many parts a run are told what setting up leaves', () => {
    const noise = { sd: 2, of: 'part' as const };
    const [fact] = only({ response: { ...measured, partsPerRun: 4 }, noise }, 'parts-meet-setup');
    // Set-up assumed at half of 2: sqrt(1 + 4/4); from 20 parts on sqrt(1 + 4/20) < 1.1.
    expect(fact?.values).toMatchObject({ parts: 4, floor: 1, enoughParts: 20, assumed: true });
    expect(fact?.values).toHaveProperty('runSd', Math.hypot(1, 1));
    const given = only({ response: { partsPerRun: 4 }, noise: { ...noise, setup: 2 } }, 'parts-meet-setup');
    expect(given[0]?.values).toMatchObject({ floor: 2, enoughParts: 5, assumed: false });
    expect(only({ response: measured, noise }, 'parts-meet-setup')).toEqual([]);
    expect(only({ response: { partsPerRun: 4 }, noise: { ...noise, setup: 0 } }, 'parts-meet-setup')).toEqual(
      [],
    );
  });

  test('hear of a gain too small for any plan, before there is a setting and with all of them', () => {
    const noise = { sd: 3, of: 'runMean' as const };
    const spots = (draft: CoachDraft) => only(draft, 'worth-having-below-sight')[0]?.values;
    const early = spots({ response: { ...measured, worthHaving: 0.5 }, noise });
    expect(early).toMatchObject({ worthHaving: 0.5 });
    expect(spots({ response: { ...measured, worthHaving: 30 }, noise })).toBeUndefined();
    const tight = spots({
      response: measured,
      noise,
      factors: buildBrief(4).factors,
      budget: { maxRuns: 12 },
    });
    // 2^(4-1) and four middles: see the promises of the proposals.
    const [plan] = proposePlans(buildBrief(4, { noise, budget: { maxRuns: 12 } }));
    expect(tight).toEqual({ worthHaving: 3, spots: plan?.detectable[0]?.size, runs: 12 });
    expect(spots({ response: measured, noise: null })).toBeUndefined();
  });

  test('of whole briefs hear of it exactly where every plan misses W', () => {
    fc.assert(
      fc.property(anyBrief({ rules: 2 }), (brief) => {
        const sizes = bestSizes(brief);
        const [fact] = only(brief, 'worth-having-below-sight');
        const missed = sizes.length > 0 && Math.min(...sizes) > (brief.response.worthHaving ?? 0);
        expect(fact !== undefined).toBe(missed);
        if (fact?.kind === 'worth-having-below-sight')
          expect(fact.values.spots).toBeCloseTo(Math.min(...sizes), 9);
      }),
      { numRuns: 60 },
    );
  });
});

test('a sound brief of the demo kind hears nothing', () => {
  const brief = buildBrief(0, {
    factors: [
      numberFactor('jaw', { step: 1 }),
      numberFactor('dwell', { unit: 's', low: 0.8, high: 1.2, usual: 1, step: 0.1 }),
      choiceFactor('film'),
    ],
  });
  expect(coach(brief)).toEqual([]);
});

describe('whatever stands in the form', () => {
  const leaf = fc.oneof(
    fc.constantFrom(
      undefined,
      null,
      '',
      ' ',
      'abc',
      0,
      -1,
      1,
      12,
      Number.NaN,
      Number.POSITIVE_INFINITY,
      true,
    ),
    fc.double(),
  );
  const kind = fc.constantFrom(undefined, null, 'number', 'choice', 'measured', 'rejects', 'flaws', 'part');
  const keys = [
    ...['name', 'panelName', 'unit', 'low', 'high', 'usual', 'step', 'min', 'max', 'hardToChange'],
    ...['lotSize', 'partsPerRun', 'usualRate', 'worthHaving', 'goal', 'target', 'settleMinutes'],
    ...['sd', 'of', 'df', 'setup', 'maxRuns', 'minutes', 'money', 'minutesPerRun', 'costPerRun'],
  ];
  const anyObject = fc.record(
    { kind, ...Object.fromEntries(keys.map((key) => [key, leaf])) },
    { requiredKeys: [] },
  );
  const anyDraft = fc.record(
    {
      response: fc.option(anyObject),
      watch: fc.option(fc.array(anyObject, { maxLength: 3 })),
      factors: fc.option(fc.array(anyObject, { maxLength: 9 })),
      budget: fc.option(anyObject),
      noise: fc.option(anyObject),
    },
    { requiredKeys: [] },
  ) as fc.Arbitrary<CoachDraft>;

  test('nothing throws, and every fact keeps to its kind', () => {
    fc.assert(
      fc.property(anyDraft, (draft) => {
        for (const fact of coach(draft)) expect(factSchema.parse(fact)).toEqual(fact);
      }),
      { numRuns: 1500 },
    );
  });

  test('an empty draft hears nothing', () => {
    expect(coach({})).toEqual([]);
  });
});

function bestSizes(brief: Parameters<typeof listBestPlans>[0]): number[] {
  try {
    return listBestPlans(brief).flatMap(({ detectable }) =>
      detectable.filter(({ unit }) => unit === 'response').map(({ size }) => size),
    );
  } catch (error) {
    if (error instanceof PlanError) return [];
    throw error;
  }
}
