import { regularizedIncompleteBeta } from './incomplete-beta.ts';
import { normalQuantile } from './normal-quantile.ts';
import { solveInLogarithms } from './solve-in-logarithms.ts';

/** Probability that an F(df1, df2) variable is below f. */
export function fCdf(f: number, df1: number, df2: number): number {
  checkDegrees('fCdf', df1, df2);
  if (f <= 0) return 0;
  if (f === Number.POSITIVE_INFINITY) return 1;
  const share = df1 * f + df2;
  return regularizedIncompleteBeta(df1 / 2, df2 / 2, (df1 * f) / share, df2 / share);
}

/** Probability that an F(df1, df2) variable is above f; small tails keep their digits. */
export function fUpperTail(f: number, df1: number, df2: number): number {
  checkDegrees('fUpperTail', df1, df2);
  if (f <= 0) return 1;
  if (f === Number.POSITIVE_INFINITY) return 0;
  const share = df1 * f + df2;
  return regularizedIncompleteBeta(df2 / 2, df1 / 2, df2 / share, (df1 * f) / share);
}

/**
 * The value that an F(df1, df2) variable exceeds with probability `upper`.
 *
 * @throws RangeError when upper is not strictly between 0 and 1, or a number of degrees of freedom is not above zero.
 */
export function fUpperQuantile(upper: number, df1: number, df2: number): number {
  checkDegrees('fUpperQuantile', df1, df2);
  if (!(upper > 0 && upper < 1))
    throw new RangeError(`fUpperQuantile: upper must be between 0 and 1, got ${upper}`);
  // Wilson & Hilferty's cube root makes F nearly normal; any start will do, this one saves steps.
  const start = Math.min(
    Math.max(Math.exp(-normalQuantile(upper) * Math.sqrt(2 / df1 + 2 / df2)), 1e-3),
    1e3,
  );
  if (upper <= 0.5) return solveInLogarithms((f) => fUpperTail(f, df1, df2), upper, start);
  return solveInLogarithms((f) => fCdf(f, df1, df2), 1 - upper, start);
}

/** The value that an F(df1, df2) variable stays below with probability p; for p near 1 use `fUpperQuantile`. */
export function fQuantile(p: number, df1: number, df2: number): number {
  return fUpperQuantile(1 - p, df1, df2);
}

function checkDegrees(name: string, df1: number, df2: number): void {
  if (!(df1 > 0 && df2 > 0))
    throw new RangeError(`${name}: degrees of freedom must be above zero, got ${df1}, ${df2}`);
}
