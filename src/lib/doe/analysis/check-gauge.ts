/** What measuring the same parts twice says of the gauge. */
export interface GaugeCheck {
  /** Parts measured twice. */
  pairs: number;
  /** Standard deviation of one reading around the part's own mean. */
  sd: number;
  /** Two readings of one part differ by less than this 19 times in 20 (repeatability limit, ISO 5725-6). */
  repeatsWithin: number;
  /** `sd` over the standard deviation of the result; null where that is not known. */
  share: number | null;
  /** `coarse`: too much of what is seen is the gauge's own. `unclear`: nothing to compare with, or too few parts. */
  call: 'fine' | 'coarse' | 'unclear';
}

/** Fewer say next to nothing of a spread. */
const fewestPairs = 3;
/** A gauge whose own spread is above this part of the whole hides differences between parts (common practice in measurement systems studies). */
const coarseShare = 0.3;

/** Holds 95 % of a normal distribution. */
const normalLimit = 1.96;

/**
 * The repeatability of a gauge from duplicates: sd = sqrt(sum of squared differences / 2n), which is the pooled standard deviation within parts, one degree
 * of freedom each.
 *
 * @param resultSd standard deviation of single readings of the result on a normal day, the gauge's own included; null where nobody knows
 * @returns null without any part measured twice
 */
export function checkGauge(
  duplicates: readonly (readonly [number, number])[],
  resultSd: number | null,
): GaugeCheck | null {
  const pairs = duplicates.length;
  if (pairs === 0) return null;
  const squares = duplicates.reduce((sum, [first, second]) => sum + (first - second) ** 2, 0);
  const sd = Math.sqrt(squares / (2 * pairs));
  const share = resultSd === null || !(resultSd > 0) ? null : sd / resultSd;
  const isKnown = share !== null && pairs >= fewestPairs;
  const call = !isKnown ? 'unclear' : share > coarseShare ? 'coarse' : 'fine';
  return { pairs, sd, repeatsWithin: normalLimit * Math.SQRT2 * sd, share, call };
}
