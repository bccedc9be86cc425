import { regularizedIncompleteGamma } from './incomplete-gamma.ts';
import { solveInLogarithms } from './solve-in-logarithms.ts';

/** Probability that a chi-square variable is below x. */
export function chiSquareCdf(x: number, df: number): number {
  return regularizedIncompleteGamma(df / 2, Math.max(x, 0) / 2).lower;
}

/** Probability that a chi-square variable is above x. */
export function chiSquareUpperTail(x: number, df: number): number {
  return regularizedIncompleteGamma(df / 2, Math.max(x, 0) / 2).upper;
}

/**
 * The value below which a chi-square variable lies with probability p.
 *
 * @throws RangeError when p is not strictly between 0 and 1, or df is not above zero.
 */
export function chiSquareQuantile(p: number, df: number): number {
  if (!(p > 0 && p < 1)) throw new RangeError(`chiSquareQuantile: p must be between 0 and 1, got ${p}`);
  if (p <= 0.5) return solveInLogarithms((x) => chiSquareCdf(x, df), p, df);
  return solveInLogarithms((x) => chiSquareUpperTail(x, df), 1 - p, df);
}
