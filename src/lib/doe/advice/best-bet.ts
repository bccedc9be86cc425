import type { Brief } from '../brief.ts';
import { setDials } from '../design/dial.ts';
import type { Fact } from '../facts.ts';
import { type Belief, beliefOf } from './belief.ts';
import { listCandidates } from './candidates.ts';
import { chooseSettings } from './choose-settings.ts';
import { type Failures, findFailures, joinFailures } from './failures.ts';
import { leaveAsUsual } from './leave-as-usual.ts';
import { modelResult, type ResultInput, type ResultModel } from './result-model.ts';
import { usualSettings } from './usual-settings.ts';
import type { BestBet, Outlook } from './verdict.ts';

/** Share of W (or of the gain) below which moving a setting is not worth the trouble. */
const NOT_WORTH_MOVING = 0.02;
/** Today's settings are the advice when a gain of W is less likely than this. */
const SMALL_CHANCE = 0.2;
/** The same for any gain at all where W is not given. */
const FAIR_CHANCE = 0.8;

/**
 * The settings to try: best by shrunken effects, inside the tested range, with all limits kept, usual where a change gains nothing.
 *
 * They are not the list of what is significant: acting only on significant effects leaves about half of the possible gain unused.
 *
 * @param results main result first
 * @throws RangeError when there is no result
 */
export function bestBet(brief: Brief, results: readonly ResultInput[]): BestBet {
  const [main] = results;
  if (main === undefined) throw new RangeError('bestBet: results must not be empty');
  return betWithModels(
    brief,
    results,
    results.map((result) => modelResult(brief, result)),
  );
}

/**
 * The same with models that are already there.
 *
 * @param mayStay places of settings that the readings say are not worth moving: each stays as usual, as long as all that stay give up too little to care about
 */
export function betWithModels(
  brief: Brief,
  results: readonly ResultInput[],
  models: readonly ResultModel[],
  mayStay: readonly number[] = [],
): BestBet {
  const [result] = results;
  const [main] = models;
  if (result === undefined || main === undefined) throw new RangeError('bestBet: results must not be empty');
  const usual = usualSettings(brief);
  const runs = result.input.runs;
  const failures = joinFailures(results.map(({ input }) => findFailures(input.runs)));
  const tested = result.analysis.used.map((index) => runs[index]?.x ?? []);
  const bends = result.analysis.curvature?.ci ?? null;
  const onlyTested = bends !== null && (bends[0] > 0 || bends[1] < 0);
  const worth = main.scale.worthHaving(brief.response, result.analysis.intercept.coefficient);
  const constrained =
    brief.forbidden.length > 0 ||
    failures.runs.length > 0 ||
    models.some(({ spec }) => spec.lower !== undefined || spec.upper !== undefined);
  const candidatesWith = (stay: ReadonlySet<number>) =>
    listCandidates({ brief, model: main, usual, failures, tested, onlyTested, constrained, stay });
  const candidates = candidatesWith(new Set());
  const question = { brief, models, usual, candidates, failures, mayMix: false, tolerance: 0 };
  const bold = chooseSettings(question);
  const hoped = Math.abs(main.expected(bold.x) - main.expected(usual));
  const mayMix = !onlyTested && brief.response.goal !== 'target';
  const chosen = chooseSettings({
    ...question,
    mayMix,
    tolerance: NOT_WORTH_MOVING * Math.max(worth ?? 0, hoped),
  });
  const { x, limitsHold } = leaveAsUsual({
    ...question,
    mayMix,
    chosen,
    mayStay,
    candidatesWith,
    worth: worth ?? 0,
  });
  const { coded, actual } = setDials(brief, x);

  const direction = goodDirection(brief, main, usual);
  const change = main.change(usual, coded);
  const gain = beliefOf(change, 0, direction);
  const moved = coded.some((value, place) => Math.abs(value - (usual[place] ?? 0)) > 1e-9);
  const chanceBetter = moved ? gain.above(0) : 0;
  const chanceWorthHaving = worth === null ? null : moved ? gain.above(worth) : 0;
  const keepToday =
    !moved || (chanceWorthHaving === null ? chanceBetter < FAIR_CHANCE : chanceWorthHaving < SMALL_CHANCE);
  const readings = tested.filter((point) => isSamePoint(point, coded)).length;
  const outlooks = models.map((model, index) => lookAt({ model, result: index, usual, coded }));
  const [mainOutlook] = outlooks;
  if (mainOutlook === undefined) throw new RangeError('bestBet: results must not be empty');
  return {
    coded,
    actual,
    predicted: mainOutlook.predicted,
    interval: mainOutlook.interval,
    versusUsual: mainOutlook.versusUsual,
    gainInterval: mainOutlook.gainInterval,
    chanceBetter,
    chanceWorthHaving,
    tested: readings > 0,
    keepToday,
    main: mainOutlook,
    watched: outlooks.slice(1),
    allLimits: jointProbability(outlooks),
    reasons: listReasons({
      brief,
      usual,
      coded,
      readings,
      onlyTested,
      failures,
      keepToday,
      chanceBetter,
      limitsHold,
      outlooks,
    }),
    basis: {
      gain: { df: change.df, parts: change.parts.map((part) => ({ ...part, mean: direction * part.mean })) },
      error: ownError(result),
      worthHaving: worth,
      direction,
    },
  };
}

/** The sign of change that is good; for a target the way towards it from usual settings. */
function goodDirection(brief: Brief, main: ResultModel, usual: readonly number[]): 1 | -1 {
  const { goal, target } = brief.response;
  if (goal === 'target') return beliefOf(main.level(usual)).mean <= main.scale.fromUnit(target ?? 0) ? 1 : -1;
  return goal === 'more' ? 1 : -1;
}

export function lookAt(question: {
  model: ResultModel;
  result: number;
  usual: readonly number[];
  coded: readonly number[];
}): Outlook {
  const { model, result, usual, coded } = question;
  const { scale, spec } = model;
  const level = beliefOf(model.level(coded));
  const start = beliefOf(model.level(usual)).mean;
  const change = beliefOf(model.change(usual, coded));
  const inUnit = (belief: Belief): [number, number] => {
    const [low, high] = belief.interval();
    return [scale.toUnit(low), scale.toUnit(high)];
  };
  const moved = (by: number) => scale.toUnit(start + by) - scale.toUnit(start);
  const [low, high] = change.interval();
  const ofPart =
    spec.limitFor === 'part' || model.knowsParts ? beliefOf(model.level(coded), model.partNoise) : null;
  return {
    result,
    predicted: scale.toUnit(level.mean),
    interval: inUnit(level),
    versusUsual: moved(change.mean),
    gainInterval: [moved(low), moved(high)],
    limitProbability: model.limitsHold(coded),
    partInterval: ofPart && inUnit(ofPart),
  };
}

function jointProbability(outlooks: readonly Outlook[]): number | null {
  const known = outlooks.flatMap(({ limitProbability }) =>
    limitProbability === null ? [] : [limitProbability],
  );
  return known.length === 0 ? null : known.reduce((product, probability) => product * probability, 1);
}

/** Error of rungs with degrees of freedom joins that of the check runs; a pseudo error has none to bring. */
function ownError({ analysis }: ResultInput): { df: number; ss: number } | null {
  const { df, sd, source, strata } = analysis.error;
  const hasDf = source === 'replicates' || source === 'replicates+high-order';
  return hasDf && df !== null && sd !== null && strata === undefined ? { df, ss: df * sd * sd } : null;
}

export function isSamePoint(first: readonly number[], second: readonly number[]): boolean {
  return first.every((value, place) => Math.abs(value - (second[place] ?? 0)) < 0.05);
}

function listReasons(known: {
  brief: Brief;
  usual: readonly number[];
  coded: readonly number[];
  readings: number;
  onlyTested: boolean;
  failures: Failures;
  keepToday: boolean;
  chanceBetter: number;
  limitsHold: boolean;
  outlooks: readonly Outlook[];
}): Fact[] {
  const { brief, usual, coded, readings, onlyTested, failures } = known;
  const letters = brief.factors.map((_, place) => String.fromCharCode(65 + place));
  const staying = letters.filter((_, place) => Math.abs((coded[place] ?? 0) - (usual[place] ?? 0)) < 1e-9);
  const facts: Fact[] = [
    readings > 0
      ? { kind: 'was-run', values: { readings }, refs: {} }
      : { kind: 'was-not-run', values: {}, refs: {} },
  ];
  if (staying.length > 0) facts.push({ kind: 'stays-as-it-is', values: {}, refs: { factors: staying } });
  if (onlyTested) facts.push({ kind: 'only-what-was-run', values: {}, refs: {} });
  if (failures.runs.length > 0)
    facts.push({
      kind: 'away-from-failures',
      values: { combinations: failures.runs.length },
      refs: { runs: failures.runs },
    });
  if (known.keepToday)
    facts.push({ kind: 'nothing-worth-changing', values: { chance: known.chanceBetter }, refs: {} });
  if (!known.limitsHold)
    facts.push({
      kind: 'limits-clash',
      values: { probability: jointProbability(known.outlooks) ?? 0 },
      refs: {},
    });
  return facts;
}
