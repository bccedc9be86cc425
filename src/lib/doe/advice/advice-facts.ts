import { defineFact } from '../define-fact.ts';
import { z } from '../zod.ts';

const interval = z.tuple([z.number(), z.number()]).nullable();
const share = z.number().min(0).max(1);

/** *clear*: holds with all effects of the result judged together; *likely*: holds alone; *not*: neither. */
const sure = z.enum(['clear', 'likely', 'not']);

/** A change of the result from low to high, in its unit (rejects: share of the lot; flaws: per lot), and what it was held against. */
const change = { change: z.number(), interval, sure, worthHaving: z.number() };

/** One of the four calls for each setting and pair; `refs.terms` is the whole tied sum, what is estimated first. */
const calls = [
  /** Reaches W: *settled* if wholly beyond it. */
  defineFact('matters', { ...change, settled: z.boolean() }),
  defineFact('real-but-small', change),
  /** `orCancel`: the sum of tied effects is small, its members may cancel. */
  defineFact('no-real-difference', { ...change, orCancel: z.boolean() }),
  defineFact('cant-tell', {
    ...change,
    because: z.enum(['too-wide', 'no-error-estimate', 'no-spread', 'bend-possible', 'not-judged']),
  }),
  /** A setting without a call of its own, because the pair it is in matters: its change with the partner (the second of `refs.factors`) low and high. */
  defineFact('depends-on-partner', {
    partnerLow: z.number(),
    partnerLowInterval: interval,
    partnerHigh: z.number(),
    partnerHighInterval: interval,
    worthHaving: z.number(),
  }),
] as const;

/** What stands beside the calls. */
const attributions = [
  /** The likeliest member of a tied sum (the first of `refs.terms`), by how effects usually are; never *clear*. */
  defineFact('likeliest-of-tied', { share }),
  /** The result at the four corners of a pair: first low or high, second low or high. */
  defineFact('pair-corners', {
    lowLow: z.number(),
    highLow: z.number(),
    lowHigh: z.number(),
    highHigh: z.number(),
  }),
  /** Further runs of the same kind that would settle what cannot be told yet, if the noise stays. */
  defineFact('would-settle', { runs: z.number() }),
  /** A watched result moves with this setting or pair. */
  defineFact('watched-moves', { change: z.number(), interval, sure }),
  /** The spread between parts changes by this ratio from low to high. */
  defineFact('steadier-matters', { ratio: z.number(), interval, sure, worthHaving: z.number() }),
] as const;

/** Can you trust it? */
const trust = [
  defineFact('all-runs-in', { runs: z.number() }),
  /** Runs without a reading, not counting failed ones; `refs.runs` are their places. */
  defineFact('runs-missing', { missing: z.number(), planned: z.number() }),
  /** Parts could not be made (*failed*) or were off the gauge: the strongest readings of all. */
  defineFact('runs-failed', { end: z.enum(['failed', 'beyondGauge']), runs: z.number() }),
  /** What all failed runs have in common and no good run has: these settings at these levels. */
  defineFact('failed-together', { levels: z.array(z.union([z.literal(-1), z.literal(1)])) }),
  /** The noise found, beside what was said before. */
  defineFact('noise-found', {
    sd: z.number(),
    df: z.number().nullable(),
    expected: z.number().nullable(),
    compared: z.enum(['as-said', 'more', 'less', 'nothing-said']),
  }),
  /** Error judged from the small effects: it holds if most effects are small. */
  defineFact('error-judged-from-small-effects', { contrasts: z.number() }),
  /** Error known by counting theory alone. */
  defineFact('error-by-counting-theory', {}),
  defineFact('no-error', { because: z.enum(['too-few-runs', 'no-spread']) }),
  /** A reading far from what all others make one expect: measure again. */
  defineFact('odd-reading', { reading: z.number(), expected: z.number(), low: z.number(), high: z.number() }),
  /** The result moves over the trial by `change` from the first run to the last. */
  defineFact('drift-seen', { change: z.number(), interval }),
  defineFact('no-drift-seen', { change: z.number(), interval }),
  defineFact('drift-not-judged', {}),
  /** No bend in the sum: its interval lies inside -W..W. Bends of two settings may cancel. */
  defineFact('no-bend-in-sum', { bend: z.number(), interval }),
  /** The middle is off the line through the corners. */
  defineFact('bends', { bend: z.number(), interval, settings: z.number() }),
  defineFact('bend-not-settled', { bend: z.number(), interval }),
  defineFact('bend-not-looked-at', {}),
  /** Fewer than five rejects or flaws in half the runs; a lot of `lotNeeded` would give five. */
  defineFact('few-counts', { lotNeeded: z.number().nullable() }),
  /** A transformation would fit better: by Box and Cox, named only when it clearly helps. */
  defineFact('other-scale-fits-better', { lambda: z.number(), interval }),
] as const;

/** What this trial cannot tell. */
const limits = [
  defineFact('nothing-outside-range', {}),
  /** These terms cannot be told apart. */
  defineFact('cannot-be-told-apart', {}),
  defineFact('hidden-by-batches', {}),
  defineFact('short-term-spread', { parts: z.number() }),
] as const;

/** The first sentence. */
const headlines = [
  defineFact('clear-gain', { gain: z.number(), interval }),
  defineFact('likely-gain', { gain: z.number(), interval }),
  defineFact('possible-gain', { gain: z.number(), interval }),
  defineFact('real-but-too-small', {}),
  defineFact('nothing-makes-a-difference', {}),
  defineFact('nothing-settled', { runs: z.number().nullable() }),
  /** No settings tried meet all limits. */
  defineFact('limits-clash', { probability: share }),
  defineFact('some-runs-failed', { runs: z.number() }),
  defineFact('trial-spoilt', { missing: z.number(), planned: z.number() }),
] as const;

/** What next, best first. */
const nextSteps = [
  defineFact('check-runs', { each: z.number(), power: share }),
  defineFact('keep-today', {}),
  defineFact('run-missing-now', { runs: z.number() }),
  defineFact('measure-again', {}),
  defineFact('narrow-range', {}),
  /** Runs that tell the terms in `refs.terms` apart. */
  defineFact('untie', {}),
  /** Runs at low, middle and high of each number setting, after a bend. */
  defineFact('follow-the-curve', {}),
  /** The best settings lie at the end of the range: move it that way. */
  defineFact('move-window', { direction: z.union([z.literal(-1), z.literal(1)]) }),
  defineFact('repeat-for-certainty', { runs: z.number() }),
] as const;

/** Why these settings. */
const reasons = [
  /** This very combination was run. */
  defineFact('was-run', { readings: z.number() }),
  defineFact('was-not-run', {}),
  /** Each setting in `refs.factors` stays as it is: changing it gains nothing. */
  defineFact('stays-as-it-is', {}),
  /** The middle is off the line: only what was run is proposed. */
  defineFact('only-what-was-run', {}),
  /** Combinations next to failed runs are left out. */
  defineFact('away-from-failures', { combinations: z.number() }),
  defineFact('nothing-worth-changing', { chance: share }),
] as const;

/** After check runs. */
const confirmation = [
  defineFact('held', { gain: z.number(), interval, predicted: z.tuple([z.number(), z.number()]) }),
  defineFact('fell-short', {
    gain: z.number(),
    interval,
    predicted: z.tuple([z.number(), z.number()]),
    because: z.enum(['below-prediction', 'below-worth-having', 'limit-crossed']),
  }),
  defineFact('not-sure-yet', {
    gain: z.number(),
    interval,
    predicted: z.tuple([z.number(), z.number()]),
    furtherPairs: z.number(),
  }),
] as const;

/** What may be said after the runs. */
export const adviceFacts = [
  ...calls,
  ...attributions,
  ...trust,
  ...limits,
  ...headlines,
  ...nextSteps,
  ...reasons,
  ...confirmation,
] as const;

export type AdviceFact = z.infer<(typeof adviceFacts)[number]>;

const adviceKinds: ReadonlySet<string> = new Set(adviceFacts.map((fact) => fact.shape.kind.value));

/** Whether a fact is one of what may be said after the runs. */
export function isAdviceFact(fact: { kind: string }): fact is AdviceFact {
  return adviceKinds.has(fact.kind);
}
