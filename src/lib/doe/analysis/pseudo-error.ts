/**
 * Error of contrasts from the contrasts themselves, for plans with (almost) no repeated runs.
 *
 * Most contrasts of a small trial are noise, so the size of the typical contrast tells the error (Lenth 1989, Technometrics 31, 469-473):
 * s0 = 1.5 median |c|; then 1.5 times the median of those |c| below 2.5 s0. Two changes to the published method:
 *
 * - the contrast under test is left out, so that a big one does not raise its own yardstick: with one to four of seven contrasts active the
 *   95 % intervals then cover .945 to .98, with it left in down to .93;
 * - one or two degrees of freedom of pure error join the median as one or two further contrasts.
 *
 * The result is no standard deviation with degrees of freedom; its limits come from `tables/pseudo-error-limits.json` alone.
 */
export interface PseudoErrorInput {
  /** Estimated contrasts that all have the same standard error. */
  contrasts: readonly number[];
  /** Standard error of a contrast according to pure error; ignored when `replicateDf` is 0. */
  replicateError: number;
  replicateDf: number;
}

export interface PseudoErrors {
  /** For testing each contrast: the error according to all others. */
  leaveOneOut: number[];
  /** The error according to all contrasts, for what is no contrast: curvature, predictions. */
  overall: number;
}

/**
 * Sizes of the contrasts that stand for pure error. Two degrees of freedom are two contrasts whose mean square is known and whose split is not;
 * the split is taken half-way between all in one (angle 0) and equal (angle 45 degrees), which keeps the result independent of any basis.
 */
const REPLICATE_SIZES: readonly (readonly number[])[] = [
  [],
  [1],
  [Math.SQRT2 * Math.sin(Math.PI / 8), Math.SQRT2 * Math.cos(Math.PI / 8)],
];

/**
 * Pseudo standard errors of contrasts.
 *
 * @throws RangeError when there are fewer than three contrasts or `replicateDf` is not 0, 1 or 2.
 */
export function estimatePseudoErrors({
  contrasts,
  replicateError,
  replicateDf,
}: PseudoErrorInput): PseudoErrors {
  const replicateSizes = REPLICATE_SIZES[replicateDf];
  if (replicateSizes === undefined)
    throw new RangeError(`estimatePseudoErrors: replicateDf must be 0, 1 or 2, got ${replicateDf}`);
  if (contrasts.length < 3)
    throw new RangeError(`estimatePseudoErrors: contrasts must be three or more, got ${contrasts.length}`);
  const sizes = Float64Array.from(contrasts, Math.abs);
  const ascending = new Float64Array(sizes.length + replicateSizes.length);
  ascending.set(sizes);
  replicateSizes.forEach((share, index) => {
    ascending[sizes.length + index] = share * replicateError;
  });
  ascending.sort();
  return {
    // Equal sizes are interchangeable, so the first place at which a size is found may be the one left out.
    leaveOneOut: Array.from(sizes, (size) => robustError(ascending, firstPlace(ascending, size))),
    overall: robustError(ascending, ascending.length),
  };
}

/** The two-step median of `ascending` without the element at place `left` (its length: none left out). */
function robustError(ascending: Float64Array, left: number): number {
  const at = (place: number) => ascending[place < left ? place : place + 1] ?? Number.NaN;
  const count = left < ascending.length ? ascending.length - 1 : ascending.length;
  const limit = 2.5 * 1.5 * medianOfFirst(at, count);
  let kept = 0;
  while (kept < count && at(kept) < limit) kept++;
  return kept === 0 ? 0 : 1.5 * medianOfFirst(at, kept);
}

function medianOfFirst(at: (place: number) => number, count: number): number {
  const middle = count >> 1;
  return count % 2 === 1 ? at(middle) : (at(middle - 1) + at(middle)) / 2;
}

function firstPlace(ascending: Float64Array, size: number): number {
  let place = 0;
  while (place < ascending.length && (ascending[place] ?? 0) < size) place++;
  return place;
}
