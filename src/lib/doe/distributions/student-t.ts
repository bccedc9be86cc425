import { fCdf, fUpperQuantile, fUpperTail } from './f.ts';
import { normalUpperTail } from './normal.ts';
import { normalQuantile } from './normal-quantile.ts';

/**
 * Probability that a Student t variable is above t; small tails keep their digits. `df` need not be whole; Infinity is the normal distribution.
 *
 * @throws RangeError when df is not above zero.
 */
export function studentTUpperTail(t: number, df: number): number {
  if (df === Number.POSITIVE_INFINITY) return normalUpperTail(t);
  const half = 0.5 * fUpperTail(t * t, 1, df);
  return t >= 0 ? half : 1 - half;
}

/** Probability that a Student t variable is below t. */
export function studentTCdf(t: number, df: number): number {
  return studentTUpperTail(-t, df);
}

/** Probability that a Student t variable is further from zero than t, on either side. */
export function studentTTwoSided(t: number, df: number): number {
  if (df === Number.POSITIVE_INFINITY) return 2 * normalUpperTail(Math.abs(t));
  return fUpperTail(t * t, 1, df);
}

/** Probability that a Student t variable is nearer to zero than t, on either side. */
export function studentTCentral(t: number, df: number): number {
  if (df === Number.POSITIVE_INFINITY) return 1 - 2 * normalUpperTail(Math.abs(t));
  return fCdf(t * t, 1, df);
}

/**
 * The value that a Student t variable exceeds with probability `upper`.
 *
 * @throws RangeError when upper is not strictly between 0 and 1, or df is not above zero.
 */
export function studentTUpperQuantile(upper: number, df: number): number {
  if (!(upper > 0 && upper < 1))
    throw new RangeError(`studentTUpperQuantile: upper must be between 0 and 1, got ${upper}`);
  if (df === Number.POSITIVE_INFINITY) return -normalQuantile(upper);
  if (upper === 0.5) return 0;
  if (upper > 0.5) return -studentTUpperQuantile(1 - upper, df);
  return Math.sqrt(fUpperQuantile(2 * upper, 1, df));
}

/** The value below which a Student t variable lies with probability p; for p near 1 use `studentTUpperQuantile`. */
export function studentTQuantile(p: number, df: number): number {
  return -studentTUpperQuantile(p, df);
}
