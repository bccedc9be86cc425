import { fitBoxCox, suggestsOtherScale } from '../analysis/box-cox.ts';
import { estimateDrift } from '../analysis/drift.ts';
import type { Brief } from '../brief.ts';
import type { PlannedRun } from '../design/proposal.ts';
import { fUpperTail } from '../distributions/f.ts';
import type { Fact } from '../facts.ts';
import { type CallContext, intervalInUnit } from './calls.ts';
import type { Failures } from './failures.ts';
import { expectedNoise, type ResultInput, type ResultModel } from './result-model.ts';

export interface TrustQuestion {
  brief: Brief;
  plan: readonly PlannedRun[];
  result: ResultInput;
  model: ResultModel;
  context: CallContext;
  /** Of each result, main first. */
  failures: readonly Failures[];
  results: readonly ResultInput[];
}

/** What speaks for and against the verdict: runs that came in, noise, bend, drift, odd readings, small counts, scale. */
export function listTrust(question: TrustQuestion): Fact[] {
  return [
    ...runsIn(question),
    ...failed(question),
    noise(question),
    bend(question.context, question.result),
    drift(question),
    ...oddReadings(question),
    ...fewCounts(question),
    ...otherScale(question),
  ].flat();
}

/** Places of planned runs without a reading that did not fail either. */
export function missingRuns({ input, analysis }: ResultInput, failures: Pick<Failures, 'runs'>): number[] {
  return input.runs.flatMap((_, index) =>
    analysis.used.includes(index) || failures.runs.includes(index) ? [] : [index],
  );
}

function runsIn({ plan, result, failures }: TrustQuestion): Fact[] {
  const ofMain = failures[0]?.runs ?? [];
  const missing = missingRuns(result, { runs: ofMain });
  const planned = Math.max(plan.length, result.input.runs.length);
  const absent = missing.length + planned - result.input.runs.length;
  if (absent > 0)
    return [{ kind: 'runs-missing', values: { missing: absent, planned }, refs: { runs: missing } }];
  return ofMain.length > 0 ? [] : [{ kind: 'all-runs-in', values: { runs: result.analysis.n }, refs: {} }];
}

/** Failures of every result: a run whose watched figure could not be read is as telling as one that could not be made. */
function failed({ results, failures }: TrustQuestion): Fact[] {
  return results.flatMap(({ input }, place) => {
    const { runs: all = [], causes = [] } = failures[place] ?? {};
    const ends = (['failed', 'beyondGauge'] as const).flatMap((end): Fact[] => {
      const runs = all.filter((index) => input.runs[index]?.end === end);
      return runs.length === 0
        ? []
        : [{ kind: 'runs-failed', values: { end, runs: runs.length }, refs: { runs, results: [place] } }];
    });
    const together = causes.map(
      ({ settings }): Fact => ({
        kind: 'failed-together',
        values: { levels: settings.map(({ level }) => level) },
        refs: {
          factors: settings.map((setting) => input.factors[setting.place]?.letter ?? ''),
          results: [place],
        },
      }),
    );
    return [...ends, ...together];
  });
}

/** With fewer than 2.5 in a hundred for so much more, or less, noise than was said, the difference is named. */
const UNLIKELY = 0.025;

function noise({ brief, result }: TrustQuestion): Fact[] {
  const { error } = result.analysis;
  if (error.source === 'none' || error.sd === null)
    return [{ kind: 'no-error', values: { because: 'too-few-runs' }, refs: {} }];
  if (error.sd === 0) return [{ kind: 'no-error', values: { because: 'no-spread' }, refs: {} }];
  const facts: Fact[] = [];
  if (error.source === 'pseudo' || error.source === 'pseudo+replicates')
    facts.push({
      kind: 'error-judged-from-small-effects',
      values: { contrasts: result.analysis.errorPlan.contrasts },
      refs: {},
    });
  if (error.source === 'known') facts.push({ kind: 'error-by-counting-theory', values: {}, refs: {} });
  const said = expectedNoise(brief, result.spec, result.analysis);
  const ratio = said === undefined ? 1 : (error.sd / said.sd) ** 2;
  const compare = () => {
    if (said === undefined) return 'nothing-said';
    const df = error.df ?? 3;
    if (ratio > 1 && fUpperTail(ratio, df, said.df) < UNLIKELY) return 'more';
    if (ratio < 1 && fUpperTail(1 / ratio, said.df, df) < UNLIKELY) return 'less';
    return 'as-said';
  };
  facts.push({
    kind: 'noise-found',
    values: { sd: error.sd, df: error.df, expected: said?.sd ?? null, compared: compare() },
    refs: {},
  });
  return facts;
}

function bend(context: CallContext, { analysis, input }: ResultInput): Fact[] {
  const { curvature } = analysis;
  if (!input.factors.some((factor) => factor.kind === 'number')) return [];
  if (curvature === undefined) return [{ kind: 'bend-not-looked-at', values: {}, refs: {} }];
  const inUnit = (value: number) => context.scale.changeInUnit(value, analysis.intercept.coefficient);
  const values = { bend: inUnit(curvature.estimate), interval: intervalInUnit(curvature.ci, inUnit) };
  const { ci } = curvature;
  if (ci !== null && (ci[0] > 0 || ci[1] < 0)) {
    const settings = input.factors.filter((factor) => factor.kind === 'number').length;
    return [{ kind: 'bends', values: { ...values, settings }, refs: {} }];
  }
  const kind = context.bendPossible ? 'bend-not-settled' : 'no-bend-in-sum';
  return [{ kind, values, refs: {} }];
}

function drift({ result, context }: TrustQuestion): Fact[] {
  const found = estimateDrift(result.input, result.analysis);
  if (found === null) return [{ kind: 'drift-not-judged', values: {}, refs: {} }];
  const inUnit = (value: number) => context.scale.changeInUnit(value, result.analysis.intercept.coefficient);
  const [low, high] = found.interval;
  const values = { change: inUnit(found.change), interval: intervalInUnit(found.interval, inUnit) };
  if (low > 0 || high < 0) return [{ kind: 'drift-seen', values, refs: {} }];
  const small = Math.max(-low, high) < context.worthHaving;
  return small
    ? [{ kind: 'no-drift-seen', values, refs: {} }]
    : [{ kind: 'drift-not-judged', values: {}, refs: {} }];
}

/** Readings that all others make very unlikely, with as many readings as there are to choose from. */
function oddReadings({ result, model, context }: TrustQuestion): Fact[] {
  const { used } = result.analysis;
  return model.posterior.leaveOneOut().flatMap((left, row): Fact[] => {
    const index = used[row];
    const reading = index === undefined ? null : (result.input.runs[index]?.y ?? null);
    if (left.expected === null || reading === null || index === undefined) return [];
    if (left.p * used.length >= 0.05) return [];
    const { toUnit } = context.scale;
    return [
      {
        kind: 'odd-reading',
        values: {
          reading,
          expected: toUnit(left.expected.mean),
          low: toUnit(left.expected.low),
          high: toUnit(left.expected.high),
        },
        refs: { runs: [index] },
      },
    ];
  });
}

function fewCounts({ result }: TrustQuestion): Fact[] {
  if (result.spec.kind === 'measured') return [];
  const counts = result.analysis.used.flatMap((index) => result.input.runs[index]?.y ?? []);
  if (counts.filter((count) => count < 5).length * 2 < counts.length) return [];
  const total = counts.reduce((sum, count) => sum + count, 0);
  const parts = result.analysis.used.reduce(
    (sum, index) => sum + (result.input.runs[index]?.n ?? result.spec.lotSize ?? 1),
    0,
  );
  const lotNeeded = total > 0 ? Math.ceil((5 * parts) / total) : null;
  return [{ kind: 'few-counts', values: { lotNeeded }, refs: {} }];
}

function otherScale({ result }: TrustQuestion): Fact[] {
  if (result.spec.kind !== 'measured' || (result.input.scale ?? 'raw') !== 'raw') return [];
  const found = fitBoxCox(result.input);
  if (found === null || !suggestsOtherScale(result.input, found)) return [];
  return [
    { kind: 'other-scale-fits-better', values: { lambda: found.lambda, interval: found.interval }, refs: {} },
  ];
}
