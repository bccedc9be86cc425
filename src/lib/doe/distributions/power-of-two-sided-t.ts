import { noncentralTUpperTail } from './noncentral-t.ts';
import { solveInLogarithms } from './solve-in-logarithms.ts';
import { studentTUpperQuantile } from './student-t.ts';

/**
 * Probability that |t| exceeds a limit when the estimate's true size is `noncentrality` of its own standard errors. Exact, both tails counted.
 *
 * Example: power of an effect of 2 standard errors, 3 degrees of freedom, 5 %: `powerBeyond(2, 3, studentTUpperQuantile(.025, 3))`.
 */
export function powerBeyond(noncentrality: number, df: number, limit: number): number {
  const far = noncentralTUpperTail(limit, df, noncentrality);
  return Math.min(1, far + noncentralTUpperTail(limit, df, -noncentrality));
}

/** Power of the two-sided t test at level `alpha`. */
export function powerOfTwoSidedT(noncentrality: number, df: number, alpha = 0.05): number {
  return powerBeyond(noncentrality, df, studentTUpperQuantile(alpha / 2, df));
}

/**
 * The true size, in standard errors of the estimate, at which |t| exceeds `limit` with probability `power`.
 *
 * @throws RangeError when the limit alone is exceeded more often than that.
 */
export function noncentralityForPower(power: number, df: number, limit: number): number {
  return solveInLogarithms((size) => 1 - powerBeyond(size, df, limit), 1 - power, limit + 1);
}
