import type { Analysis, TermEstimate } from '../analysis/analysis.ts';
import { lettersOf } from '../analysis/terms.ts';
import type { Fact } from '../facts.ts';
import type { ResponseScale } from './response-scale.ts';
import type { ResultInput, ResultModel } from './result-model.ts';

/** *clear*: with all effects of the result judged together; *likely*: alone; *not*: neither. */
export type Sure = 'clear' | 'likely' | 'not';

/** What a call is decided by: an interval and W, all on the scale of the analysis. */
export interface CallQuestion {
  ci: [number, number] | null;
  pFamily: number | null;
  worthHaving: number;
  alpha: number;
}

export interface Call {
  call: 'matters' | 'real-but-small' | 'no-real-difference' | 'cant-tell';
  settled: boolean;
  sure: Sure;
}

/** One of the four calls, by where the interval lies against zero and W. */
export function decideCall({ ci, pFamily, worthHaving, alpha }: CallQuestion): Call {
  if (ci === null) return { call: 'cant-tell', settled: false, sure: 'not' };
  const [low, high] = ci;
  const far = Math.max(Math.abs(low), Math.abs(high));
  const near = Math.min(Math.abs(low), Math.abs(high));
  const excludesZero = low > 0 || high < 0;
  const sure: Sure = !excludesZero ? 'not' : pFamily !== null && pFamily < alpha ? 'clear' : 'likely';
  if (excludesZero)
    return far >= worthHaving
      ? { call: 'matters', settled: near >= worthHaving, sure }
      : { call: 'real-but-small', settled: false, sure };
  return { call: far < worthHaving ? 'no-real-difference' : 'cant-tell', settled: false, sure };
}

/** What every call of one result shares. */
export interface CallContext {
  analysis: Analysis;
  scale: ResponseScale;
  /** W on the scale of the analysis, 0 where it is not given, and in the result's unit. */
  worthHaving: number;
  worthInUnit: number;
  /** Place of the result. */
  result: number;
  /** Whether the middle may be off the line: then a number setting is never said to make no difference. */
  bendPossible: boolean;
}

export function callContextOf({ analysis, spec }: ResultInput, { scale }: ResultModel): CallContext {
  const worthHaving = scale.worthHaving(spec, analysis.intercept.coefficient) ?? 0;
  // Everything but an interval of the bend inside -W..W.
  const bend = analysis.curvature?.ci;
  return {
    analysis,
    scale,
    worthHaving,
    worthInUnit: spec.worthHaving ?? 0,
    result: 0,
    bendPossible: bend == null || Math.max(-bend[0], bend[1]) >= worthHaving,
  };
}

export function callOf(term: TermEstimate, context: CallContext): Call {
  return decideCall({
    ci: term.ci,
    pFamily: term.pFamily,
    worthHaving: context.worthHaving,
    alpha: context.analysis.basis.alpha,
  });
}

/** The call of a setting or a pair as a fact, for the whole tied sum. */
export function callFact(term: TermEstimate, context: CallContext): Fact {
  const { analysis, scale, result } = context;
  const { call, settled, sure } = callOf(term, context);
  const center = analysis.intercept.coefficient;
  const inUnit = (value: number) => scale.changeInUnit(value, center);
  const tied = term.aliasedWith.filter((other) => other.length <= 2);
  const refs = { terms: [term.term, ...tied], factors: lettersOf(term.term), results: [result] };
  const values = {
    change: inUnit(term.effect),
    interval: intervalInUnit(term.ci, inUnit),
    sure,
    worthHaving: context.worthInUnit,
  };
  if (call === 'matters') return { kind: call, values: { ...values, settled }, refs };
  if (call === 'real-but-small') return { kind: call, values, refs };
  if (call === 'no-real-difference') {
    if (context.bendPossible && isNumberSetting(term.term, analysis))
      return { kind: 'cant-tell', values: { ...values, because: 'bend-possible' }, refs };
    return { kind: call, values: { ...values, orCancel: tied.length > 0 }, refs };
  }
  return { kind: 'cant-tell', values: { ...values, because: whyOpen(term, analysis) }, refs };
}

/** For a setting that has no estimate at all. */
export function uncalledFact(term: string, context: CallContext): Fact {
  return {
    kind: 'cant-tell',
    values: {
      change: 0,
      interval: null,
      sure: 'not',
      worthHaving: context.worthInUnit,
      because: 'not-judged',
    },
    refs: { terms: [term], factors: lettersOf(term), results: [context.result] },
  };
}

export function intervalInUnit(
  interval: [number, number] | null,
  inUnit: (value: number) => number,
): [number, number] | null {
  return interval && [inUnit(interval[0]), inUnit(interval[1])];
}

function isNumberSetting(term: string, { basis }: Analysis): boolean {
  return term.length === 1 && basis.kinds[basis.letters.indexOf(term)] === 'number';
}

function whyOpen(
  term: TermEstimate,
  analysis: Analysis,
): 'too-wide' | 'no-error-estimate' | 'no-spread' | 'not-judged' {
  if (term.ci !== null) return 'too-wide';
  if (term.se === 0) return 'no-spread';
  return analysis.error.source === 'none' ? 'no-error-estimate' : 'not-judged';
}
