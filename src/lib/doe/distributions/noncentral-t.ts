import { averageOverChi } from './average-over-chi.ts';
import { normalUpperTail } from './normal.ts';

/**
 * Probability that a non-central t variable (Z + noncentrality) / (s / sigma) is above t, with s on `df` degrees of freedom (Infinity allowed).
 *
 * @throws RangeError when df is not above zero.
 */
export function noncentralTUpperTail(t: number, df: number, noncentrality: number): number {
  if (!(df > 0)) throw new RangeError(`noncentralTUpperTail: df must be above zero, got ${df}`);
  if (df === Number.POSITIVE_INFINITY) return normalUpperTail(t - noncentrality);
  return averageOverChi({
    of: (ratio) => normalUpperTail(t * ratio - noncentrality),
    df,
    rate: noncentrality,
  });
}

/** Probability that a non-central t variable is below t. */
export function noncentralTCdf(t: number, df: number, noncentrality: number): number {
  return noncentralTUpperTail(-t, df, -noncentrality);
}
