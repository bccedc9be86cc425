import type { Brief } from '../brief.ts';
import { studentTUpperQuantile } from '../distributions/student-t.ts';
import type { Fact } from '../facts.ts';
import { beliefOf } from './belief.ts';
import type { BestBet, ConfirmationVerdict } from './verdict.ts';

export interface CheckReadings {
  /** Figures of the runs at the new settings and at usual, on the scale of the trial's analysis. */
  atBest: readonly number[];
  atUsual: readonly number[];
  /** Figures of watched results at the new settings, in the order of the brief. */
  watchedAtBest?: readonly (readonly number[])[];
}

const MOST_PAIRS = 50;

/** The figures that check runs are judged by. Better is positive. */
export interface CheckComparison {
  meanAtBest: number;
  meanAtUsual: number;
  gain: number;
  /** Of one run, pooled within both kinds and with the trial's own error; null without spread to judge by. */
  sd: number | null;
  df: number;
  interval: [number, number] | null;
  /** Where the gain was expected, by the belief that chose the settings. */
  predicted: [number, number];
}

/** @throws RangeError when either kind has no run or a figure is not finite */
export function compareCheckRuns(
  { basis }: Pick<BestBet, 'basis'>,
  readings: CheckReadings,
): CheckComparison {
  const { atBest, atUsual } = readings;
  if (atBest.length === 0 || atUsual.length === 0)
    throw new RangeError('judgeConfirmation: readings need at least one run of each kind');
  if (![...atBest, ...atUsual].every(Number.isFinite))
    throw new RangeError('judgeConfirmation: readings must be finite numbers');
  const { direction, error } = basis;
  const [meanAtBest, meanAtUsual] = [mean(atBest), mean(atUsual)];
  const gain = direction * (meanAtBest - meanAtUsual);
  const share = 1 / atBest.length + 1 / atUsual.length;
  const predicted = beliefOf(basis.gain, share).interval();

  const df = atBest.length + atUsual.length - 2 + (error?.df ?? 0);
  const ss = squares(atBest) + squares(atUsual) + (error?.ss ?? 0);
  const sd = df > 0 ? Math.sqrt(ss / df) : null;
  const halfWidth =
    sd === null || !(sd > 0) ? null : studentTUpperQuantile(0.025, df) * sd * Math.sqrt(share);
  const interval: [number, number] | null = halfWidth === null ? null : [gain - halfWidth, gain + halfWidth];
  return { meanAtBest, meanAtUsual, gain, sd, df, interval, predicted };
}

/**
 * Whether check runs confirm the gain. Both kinds were run mixed within one session, so that a good or bad day cancels.
 *
 * Held: the 95 % interval of the gain excludes zero on the good side and the gain is not below the predicted range. Fell short: below that range, or
 * wholly below the gain worth having, or a watched limit is crossed. Else not sure yet, with the number of further pairs that would tell.
 *
 * @throws RangeError when either kind has no run or a figure is not finite
 */
export function judgeConfirmation(brief: Brief, bet: BestBet, readings: CheckReadings): ConfirmationVerdict {
  const { worthHaving } = bet.basis;
  const { gain, interval, predicted, sd, df } = compareCheckRuns(bet, readings);

  const because = whyShort({
    gain,
    interval,
    predicted,
    worthHaving,
    crossed: crossesLimit(brief, readings),
  });
  const shared = { gain, interval, predicted };
  const about = (fact: Fact): Fact[] => [fact];
  if (because !== null)
    return {
      outcome: 'fellShort',
      ...shared,
      furtherPairs: 0,
      facts: about({ kind: 'fell-short', values: { ...shared, because }, refs: { results: [0] } }),
    };
  if (interval !== null && interval[0] > 0)
    return {
      outcome: 'held',
      ...shared,
      furtherPairs: 0,
      facts: about({ kind: 'held', values: shared, refs: { results: [0] } }),
    };
  const furtherPairs = pairsToTell({
    gain,
    sd,
    df,
    pairs: Math.min(readings.atBest.length, readings.atUsual.length),
  });
  return {
    outcome: 'notSureYet',
    ...shared,
    furtherPairs,
    facts: about({ kind: 'not-sure-yet', values: { ...shared, furtherPairs }, refs: { results: [0] } }),
  };
}

function whyShort(known: {
  gain: number;
  interval: [number, number] | null;
  predicted: [number, number];
  worthHaving: number | null;
  crossed: boolean;
}): 'limit-crossed' | 'below-prediction' | 'below-worth-having' | null {
  const { gain, interval, predicted, worthHaving, crossed } = known;
  if (crossed) return 'limit-crossed';
  if (gain < predicted[0]) return 'below-prediction';
  if (interval !== null && worthHaving !== null && interval[1] < worthHaving) return 'below-worth-having';
  return null;
}

function crossesLimit({ watch }: Brief, { watchedAtBest = [] }: CheckReadings): boolean {
  return watch.some((spec, index) => {
    const figures = watchedAtBest[index];
    if (figures === undefined || figures.length === 0) return false;
    const figure = mean(figures);
    return (
      figure < (spec.lower ?? Number.NEGATIVE_INFINITY) || figure > (spec.upper ?? Number.POSITIVE_INFINITY)
    );
  });
}

/** Further pairs until the interval would leave zero, if gain and spread stay as they are. */
function pairsToTell(known: { gain: number; sd: number | null; df: number; pairs: number }): number {
  const { gain, sd, df, pairs } = known;
  if (sd === null || !(gain > 0)) return pairs;
  for (let further = 1; further < MOST_PAIRS; further++) {
    const limit = studentTUpperQuantile(0.025, df + 2 * further);
    if (limit * sd * Math.sqrt(2 / (pairs + further)) < gain) return further;
  }
  return MOST_PAIRS;
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

function squares(values: readonly number[]): number {
  const center = mean(values);
  return values.reduce((sum, value) => sum + (value - center) ** 2, 0);
}
