import { describe, expect, test } from 'vitest';
import { buildBrief, choiceFactor, numberFactor } from '../../../../tests/builders/brief.ts';
import type { Brief, FactorSpec, ResponseSpec } from '../brief.ts';
import { PlanError, type PlanErrorCode, planRefusalSchema } from './plan-error.ts';
import { proposePlans } from './propose-plans.ts';

const withFactor = (factor: FactorSpec) => buildBrief(0, { factors: [factor, numberFactor('other')] });
const withResponse = (more: Partial<ResponseSpec>) =>
  buildBrief(3, { response: { ...buildBrief(1).response, ...more } });
const { worthHaving: _, ...withoutWorth } = buildBrief(1).response;

const faults: [string, Brief, PlanErrorCode, string, number | null][] = [
  [
    'low equals high',
    withFactor(numberFactor('jaw', { low: 150, high: 150 })),
    'low-not-below-high',
    'factors.0.low',
    null,
  ],
  [
    'low above high',
    withFactor(numberFactor('jaw', { low: 170 })),
    'low-not-below-high',
    'factors.0.low',
    null,
  ],
  [
    'usual below low',
    withFactor(numberFactor('jaw', { usual: 130 })),
    'usual-outside',
    'factors.0.usual',
    140,
  ],
  [
    'usual above high',
    withFactor(numberFactor('jaw', { usual: 170 })),
    'usual-outside',
    'factors.0.usual',
    160,
  ],
  [
    'not a number',
    withFactor(numberFactor('jaw', { low: Number.NaN })),
    'not-a-number',
    'factors.0.low',
    null,
  ],
  [
    'infinite',
    withFactor(numberFactor('jaw', { high: Number.POSITIVE_INFINITY })),
    'not-a-number',
    'factors.0.high',
    null,
  ],
  [
    'below the machine',
    withFactor(numberFactor('jaw', { min: 145 })),
    'beyond-machine-limits',
    'factors.0.low',
    145,
  ],
  [
    'beyond the machine',
    withFactor(numberFactor('jaw', { max: 155 })),
    'beyond-machine-limits',
    'factors.0.high',
    155,
  ],
  ['dial too coarse', withFactor(numberFactor('jaw', { step: 15 })), 'step-too-coarse', 'factors.0.step', 10],
  ['step of nothing', withFactor(numberFactor('jaw', { step: 0 })), 'not-positive', 'factors.0.step', null],
  [
    'choice of one',
    withFactor(choiceFactor('film', { high: ' First' })),
    'same-choice-names',
    'factors.0.high',
    null,
  ],
  ['nameless', withFactor(numberFactor(' ')), 'empty-name', 'factors.0.name', null],
  [
    'negative wait',
    withFactor(numberFactor('jaw', { settleMinutes: -1 })),
    'out-of-range',
    'factors.0.settleMinutes',
    0,
  ],
  ['a name twice', withFactor(numberFactor('Other')), 'duplicate-name', 'factors.1.name', null],
  [
    'a result twice',
    { ...buildBrief(2), watch: [buildBrief(2).response] },
    'duplicate-name',
    'watch.0.name',
    null,
  ],
  ['no settings', buildBrief(0), 'no-factors', 'factors', 1],
  ['eight settings', buildBrief(8), 'too-many-factors', 'factors', 7],
  [
    'three hard',
    buildBrief(0, { factors: ['a', 'b', 'c'].map((name) => numberFactor(name, { hardToChange: true })) }),
    'too-many-hard-factors',
    'factors.2.hardToChange',
    2,
  ],
  [
    'seven settings, four runs',
    buildBrief(7, { budget: { maxRuns: 4 } }),
    'too-few-runs',
    'budget.maxRuns',
    8,
  ],
  [
    'five settings, seven runs',
    buildBrief(5, { budget: { maxRuns: 7 } }),
    'too-few-runs',
    'budget.maxRuns',
    8,
  ],
  ['half a run', buildBrief(3, { budget: { maxRuns: 8.5 } }), 'not-whole', 'budget.maxRuns', 9],
  [
    'no time',
    buildBrief(3, { budget: { maxRuns: 20, minutes: 10, minutesPerRun: 5 } }),
    'too-little-time',
    'budget.minutes',
    20,
  ],
  [
    'no money',
    buildBrief(3, { budget: { maxRuns: 20, money: 10, costPerRun: 5 } }),
    'too-little-money',
    'budget.money',
    20,
  ],
  [
    'time without a measure',
    buildBrief(3, { budget: { maxRuns: 20, minutes: 100 } }),
    'missing',
    'budget.minutesPerRun',
    null,
  ],
  ['no W', buildBrief(3, { response: withoutWorth }), 'missing', 'response.worthHaving', null],
  ['W of nothing', withResponse({ worthHaving: 0 }), 'not-positive', 'response.worthHaving', null],
  ['target without a value', withResponse({ goal: 'target' }), 'missing', 'response.target', null],
  ['limits crossed', withResponse({ lower: 5, upper: 4 }), 'limits-crossed', 'response.upper', null],
  ['rejects of nothing', withResponse({ kind: 'rejects' }), 'missing', 'response.lotSize', null],
  [
    'more rejects than parts',
    withResponse({ kind: 'rejects', lotSize: 50, usualRate: 2, worthHaving: 0.1 }),
    'out-of-range',
    'response.usualRate',
    1,
  ],
  ['noise of nothing', buildBrief(3, { noise: { sd: 0, of: 'part' } }), 'not-positive', 'noise.sd', null],
  [
    'noise not a number',
    buildBrief(3, { noise: { sd: Number.NaN, of: 'part' } }),
    'not-a-number',
    'noise.sd',
    null,
  ],
  [
    'five shifts',
    buildBrief(3, { blocks: { name: 'shift', kind: 'shift', count: 5 } }),
    'too-many-blocks',
    'blocks.count',
    4,
  ],
  [
    'three shifts',
    buildBrief(3, { blocks: { name: 'shift', kind: 'shift', count: 3 } }),
    'out-of-range',
    'blocks.count',
    2,
  ],
  ['a rule on nothing', buildBrief(3, { forbidden: [{}] }), 'empty-rule', 'forbidden.0', null],
  [
    'a rule on a stranger',
    buildBrief(3, { forbidden: [{ A: 1, D: 1 }] }),
    'unknown-letter',
    'forbidden.0.D',
    null,
  ],
  [
    'a whole end forbidden',
    buildBrief(3, { forbidden: [{ A: 1, B: 1 }, { B: -1 }] }),
    'everything-forbidden',
    'forbidden.1',
    null,
  ],
  [
    'everything forbidden',
    buildBrief(2, {
      forbidden: [
        { A: 1, B: 1 },
        { A: 1, B: -1 },
        { A: -1, B: 1 },
        { A: -1, B: -1 },
      ],
    }),
    'everything-forbidden',
    'forbidden.1',
    null,
  ],
];

describe('nonsense gets a typed error that names the field', () => {
  test.each(faults)('%s', (_name, brief, code, field, need) => {
    const refusal = refusalOf(brief);
    expect(refusal).toMatchObject({ code, field, need });
    expect(planRefusalSchema.parse(refusal)).toEqual({ code, field, need });
  });

  test('a shape that no form could send is named too', () => {
    const broken = JSON.parse(JSON.stringify({ ...buildBrief(2), budget: {} })) as Brief;
    expect(refusalOf(broken)).toMatchObject({ code: 'missing', field: 'budget.maxRuns' });
  });

  test('rules that leave no plan 60 % as good as a balanced one are refused by the heaviest', () => {
    const forbidden = [
      { A: 1, B: 1 },
      { C: 1, D: -1 },
      { E: 1, F: 1 },
      { A: -1, G: -1 },
      { B: -1, F: -1 },
    ] as Brief['forbidden'];
    expect(refusalOf(buildBrief(7, { forbidden, budget: { maxRuns: 40 } }))?.code).toBe('too-much-forbidden');
  });
});

function refusalOf(brief: Brief): PlanError | undefined {
  try {
    proposePlans(brief);
  } catch (error) {
    if (error instanceof PlanError) return error;
    throw error;
  }
  return undefined;
}
