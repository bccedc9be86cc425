import { averageOverChi } from './average-over-chi.ts';
import { normalUpperTail } from './normal.ts';
import { solveInLogarithms } from './solve-in-logarithms.ts';
import { studentTUpperQuantile } from './student-t.ts';

/**
 * Probability that the largest of |Z1|, …, |Zk|, all divided by one s / sigma on `df` degrees of freedom, is above `limit`.
 *
 * Exact for uncorrelated estimates, an upper bound for correlated ones (Z. Sidak, 1967, JASA 62, 626-633). Infinity is allowed for df.
 *
 * @throws RangeError when k is not a whole number from 1 or df is not above zero.
 */
export function studentizedMaximumModulusUpperTail(limit: number, k: number, df: number): number {
  if (!(Number.isInteger(k) && k >= 1))
    throw new RangeError(`studentizedMaximumModulusUpperTail: k must be a whole number from 1, got ${k}`);
  if (!(df > 0)) throw new RangeError(`studentizedMaximumModulusUpperTail: df must be above zero, got ${df}`);
  if (limit <= 0) return 1;
  // 1 - (1 - 2Q)^k without losing the digits of a small Q.
  const anyBeyond = (ratio: number) => -Math.expm1(k * Math.log1p(-2 * normalUpperTail(limit * ratio)));
  if (df === Number.POSITIVE_INFINITY) return anyBeyond(1);
  return averageOverChi({ of: anyBeyond, df, rate: 12 });
}

/** The limit that the studentized maximum modulus of k means exceeds with probability `upper`. */
export function studentizedMaximumModulusQuantile(upper: number, k: number, df: number): number {
  if (!(upper > 0 && upper < 1))
    throw new RangeError(`studentizedMaximumModulusQuantile: upper must be between 0 and 1, got ${upper}`);
  const start = studentTUpperQuantile(upper / (2 * k), df);
  return solveInLogarithms((limit) => studentizedMaximumModulusUpperTail(limit, k, df), upper, start);
}
