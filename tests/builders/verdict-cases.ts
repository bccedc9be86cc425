import type { VerdictView } from '../../src/features/verdict/verdict-view.ts';
import type { Brief, FactorSpec } from '../../src/lib/doe/index.ts';
import { publishedTrial } from './published-trials.ts';
import { luck, type MadeTrial, makeView, planFor, type Reading } from './verdict-view.ts';

export { resultsOf } from './verdict-view.ts';

const jaw: FactorSpec = {
  kind: 'number',
  name: 'Jaw temp',
  panelName: 'JAW TEMP',
  unit: '°C',
  low: 140,
  high: 160,
  usual: 150,
  step: 1,
  min: 120,
  max: 200,
};
const dwell: FactorSpec = {
  kind: 'number',
  name: 'Dwell',
  panelName: 'DWELL',
  unit: 's',
  low: 0.8,
  high: 1,
  usual: 0.8,
  step: 0.05,
};
const press: FactorSpec = {
  kind: 'number',
  name: 'Press',
  panelName: 'PRESS',
  unit: 'bar',
  low: 3,
  high: 4,
  usual: 3,
  step: 0.1,
  min: 2,
  max: 6,
};
const film: FactorSpec = {
  kind: 'choice',
  name: 'Film',
  panelName: 'FILM',
  low: 'Supplier A',
  high: 'Supplier B',
  usual: 'low',
};

export const seals: Brief = {
  response: {
    name: 'seal strength',
    unit: 'N',
    kind: 'measured',
    goal: 'more',
    worthHaving: 3,
    partsPerRun: 3,
    lower: 36,
    limitFor: 'mean',
  },
  watch: [
    {
      name: 'burnt edges',
      unit: '',
      kind: 'rejects',
      lotSize: 50,
      goal: 'less',
      upper: 0.16,
      usualRate: 0.04,
    },
  ],
  factors: [jaw, dwell, press, film],
  forbidden: [],
  budget: { maxRuns: 20, minutesPerRun: 12 },
  noise: { sd: 1.5, of: 'part' },
};

/** The same without its limit. */
const { lower: _, limitFor: __, ...unlimited } = seals.response;

const lonely = (brief: Partial<Brief>): Brief => ({ ...seals, watch: [], ...brief });

/** A trial read by a known process with seeded luck; the watched count stays where it is. */
function sealTrial(brief: Brief, truth: (x: readonly number[]) => number, seed: number, sd = 0.7): MadeTrial {
  const { near, parts, count } = luck(seed);
  const plan = planFor(brief);
  const size = brief.response.partsPerRun ?? 1;
  const readings = plan.map(({ coded }): Reading[] => {
    const made = parts(near(truth(coded), sd), sd, size).map((part) => Math.round(part * 10) / 10);
    const main: Reading = {
      y: made.reduce((sum, part) => sum + part, 0) / size,
      ...(size > 1 && { parts: made }),
    };
    return [main, ...brief.watch.map(() => ({ y: count(0.05, 50), n: 50 }))];
  });
  return { brief, plan, readings };
}

const at = (x: readonly number[], place: number) => x[place] ?? 0;
const strongTruth = (x: readonly number[]) => 36 + 3 * at(x, 0) + 1.6 * at(x, 1) + 0.1 * at(x, 2);
const strong = () => sealTrial(seals, strongTruth, 11);

function rejectsTrial(): MadeTrial {
  const brief = lonely({
    response: {
      name: 'leaking pouches',
      unit: '',
      kind: 'rejects',
      lotSize: 200,
      goal: 'less',
      usualRate: 0.15,
      worthHaving: 0.05,
    },
    factors: [jaw, dwell, press],
    noise: null,
  });
  const { count } = luck(5);
  const plan = planFor(brief);
  const readings = plan.map(({ coded }) => [
    { y: count(0.13 - 0.07 * at(coded, 0) - 0.02 * at(coded, 1), 200), n: 200 },
  ]);
  return {
    brief,
    plan,
    readings,
    more: { value: { partsPerWeek: 10_000, costOfBadPart: 0.4, currency: 'USD' } },
  };
}

function withRuns(
  trial: MadeTrial,
  change: (place: number, coded: readonly number[]) => Reading | null,
): MadeTrial {
  const readings = trial.readings.map((run, place) => {
    const changed = change(place, trial.plan[place]?.coded ?? []);
    return changed === null ? run : run.map(() => changed);
  });
  return { ...trial, readings };
}

/** Twelve trials, each with another thing to say; planned, read and judged by the core. */
const made = {
  strong,
  reversed: () =>
    sealTrial(
      lonely({ factors: [jaw, { ...dwell, usual: 1 }, press] }),
      (x) => 36 + 0.2 * at(x, 0) + 3.5 * at(x, 0) * at(x, 1),
      3,
    ),
  curved: () =>
    sealTrial(
      lonely({
        response: {
          name: 'wall thickness',
          unit: 'mm',
          kind: 'measured',
          goal: 'target',
          target: 12,
          worthHaving: 0.5,
          partsPerRun: 1,
        },
        factors: [{ ...jaw, usual: 140 }],
        noise: null,
      }),
      (x) => 11 + 0.6 * at(x, 0) - 1.8 * at(x, 0) ** 2 + 1.5,
      9,
      0.1,
    ),
  batches: () => publishedTrial('filtration-2-4-two-blocks', {}),
  nothing: () => sealTrial(lonely({ response: unlimited, factors: [jaw, dwell, film] }), () => 36, 21, 0.4),
  tied: () => publishedTrial('filtration-2-4-1-half', {}),
  oddReading: () => {
    const trial = sealTrial(lonely({ factors: [jaw, dwell, press] }), strongTruth, 8);
    return withRuns(trial, (place) => (place === 3 ? { y: 4.1, parts: [4.1, 4.0, 4.2] } : null));
  },
  rejects: rejectsTrial,
  failedCorner: () =>
    withRuns(sealTrial(lonely({ factors: [jaw, dwell, press] }), strongTruth, 4), (_, x) =>
      at(x, 0) === 1 && at(x, 1) === 1 ? { y: null, end: 'failed' } : null,
    ),
  lostRuns: () => ({
    ...withRuns(sealTrial(lonely({ factors: [jaw, dwell, press] }), strongTruth, 2), (place) =>
      place > 5 ? { y: null, end: 'notRun' } : null,
    ),
    more: { endedEarly: true },
  }),
  held: () => ({ ...strong(), checks: { atBest: [41, 40.4, 41.3], atUsual: [34.6, 35.2, 34.9] } }),
  fellShort: () => ({ ...strong(), checks: { atBest: [35.4, 34.6, 35.3], atUsual: [34.6, 35.2, 34.9] } }),
} satisfies Record<string, () => MadeTrial>;

export type CaseName = keyof typeof made;
export const caseNames = Object.keys(made) as CaseName[];

export function trialOf(name: CaseName): MadeTrial {
  return made[name]();
}

const views = new Map<CaseName, VerdictView>();

/** The view of a case; made once, for it takes the core a while. */
export function verdictCase(name: CaseName): VerdictView {
  const view = views.get(name) ?? makeView(trialOf(name));
  views.set(name, view);
  return view;
}
