import { estimatePseudoErrors } from '../analysis/pseudo-error.ts';
import { normalUpperTail } from '../distributions/normal.ts';
import { createNormalSource } from '../random/normal-numbers.ts';
import { createUniformSource } from '../random/random-numbers.ts';

/** ln of the statistic at which the tails are tabulated: from `start`, `step` apart. */
export const GRID = { start: Math.log(0.2), step: 0.166, count: 48 } as const;

/** Logarithms of upper-tail probabilities over `GRID`. */
export interface PseudoErrorTails {
  /** |contrast| over the pseudo error of all others. */
  single: number[];
  /** An independent normal number, such as curvature, over the pseudo error of all contrasts. */
  outside: number[];
  /** The largest of the single statistics. */
  family: number[];
  /** The largest of the single statistics and one outside. */
  familyAndOutside: number[];
}

const BINS = { start: -14, width: 0.0025, count: 9600 } as const;

/**
 * Tails of all statistics of a plan in which nothing is active, by simulation.
 *
 * A contrast is independent of the error that leaves it out, so its tail is the normal tail averaged over simulated errors, smooth far beyond what
 * counting could reach. The largest is counted; where fewer than 2,000 draws are left, its tail follows the sum of the single tails (which bounds
 * it) in their last ratio.
 */
export function simulatePseudoErrorTails(plan: {
  contrasts: number;
  replicateDf: number;
  draws: number;
  seed: number;
}): PseudoErrorTails {
  const normal = createNormalSource(createUniformSource(plan.seed));
  const leaveOneOut = new Float64Array(BINS.count);
  const overall = new Float64Array(BINS.count);
  const largest = new Float64Array(BINS.count);
  const largestWithOutside = new Float64Array(BINS.count);
  for (let draw = 0; draw < plan.draws; draw++) {
    const contrasts = Array.from({ length: plan.contrasts }, normal);
    let replicateSquares = 0;
    for (let replicate = 0; replicate < plan.replicateDf; replicate++) replicateSquares += normal() ** 2;
    const replicateError = Math.sqrt(replicateSquares / Math.max(1, plan.replicateDf));
    const errors = estimatePseudoErrors({ contrasts, replicateError, replicateDf: plan.replicateDf });
    let most = 0;
    errors.leaveOneOut.forEach((error, index) => {
      count(leaveOneOut, error);
      most = Math.max(most, Math.abs(contrasts[index] ?? 0) / error);
    });
    count(overall, errors.overall);
    count(largest, most);
    count(largestWithOutside, Math.max(most, Math.abs(normal()) / errors.overall));
  }
  const single = gridValues((t) => averageNormalTail(leaveOneOut, t));
  const outside = gridValues((t) => averageNormalTail(overall, t));
  return {
    single: straightFarTail(single.map(Math.log)),
    outside: straightFarTail(outside.map(Math.log)),
    family: straightFarTail(
      countedTail(
        largest,
        single.map((tail) => plan.contrasts * tail),
      ),
    ),
    familyAndOutside: straightFarTail(
      countedTail(
        largestWithOutside,
        single.map((tail, index) => plan.contrasts * tail + (outside[index] ?? 0)),
      ),
    ),
  };
}

/**
 * Below one in a million the smallest simulated errors alone decide; there the tail goes on as a power of the statistic, which is what the ratio of a
 * normal number to an error with positive density at zero does.
 */
function straightFarTail(logTail: number[]): number[] {
  const last = logTail.findIndex((value) => value < Math.log(1e-6));
  if (last < 1) return logTail;
  const slope = (logTail[last] ?? 0) - (logTail[last - 1] ?? 0);
  return logTail.map((value, index) =>
    index <= last ? value : (logTail[last] ?? 0) + slope * (index - last),
  );
}

function count(bins: Float64Array, value: number): void {
  const place = Math.floor((Math.log(value) - BINS.start) / BINS.width);
  const bin = Math.max(0, Math.min(BINS.count - 1, place));
  bins[bin] = (bins[bin] ?? 0) + 1;
}

function gridValues(tail: (t: number) => number): number[] {
  return Array.from({ length: GRID.count }, (_, index) => tail(Math.exp(GRID.start + index * GRID.step)));
}

function averageNormalTail(errors: Float64Array, t: number): number {
  let sum = 0;
  let total = 0;
  errors.forEach((times, bin) => {
    if (times === 0) return;
    sum += times * 2 * normalUpperTail(t * Math.exp(BINS.start + (bin + 0.5) * BINS.width));
    total += times;
  });
  return sum / total;
}

function countedTail(largest: Float64Array, bound: number[]): number[] {
  const total = largest.reduce((sum, times) => sum + times, 0);
  let lastRatio = 1;
  return bound.map((upper, index) => {
    const from = (GRID.start + index * GRID.step - BINS.start) / BINS.width;
    const whole = Math.floor(from);
    let above = (largest[whole] ?? 0) * (1 - (from - whole));
    for (let bin = whole + 1; bin < largest.length; bin++) above += largest[bin] ?? 0;
    if (above < 2000) return Math.log(upper * lastRatio);
    lastRatio = above / total / upper;
    return Math.log(above / total);
  });
}
