import { logGamma } from './log-gamma.ts';

const tiny = 1e-300;

/**
 * Regularised incomplete beta function I_x(a, b): the probability that a beta(a, b) variable is below x.
 *
 * `complement` is 1 - x. Callers that know it without subtraction should pass it: then tails far below 1e-16 keep all their digits.
 * Continued fraction by Lentz's method (DLMF 8.17.22).
 *
 * @throws RangeError when a or b is not above zero or x is outside 0..1.
 */
export function regularizedIncompleteBeta(
  a: number,
  b: number,
  x: number,
  complement: number = 1 - x,
): number {
  if (!(a > 0 && b > 0))
    throw new RangeError(`regularizedIncompleteBeta: a and b must be above zero, got ${a}, ${b}`);
  if (!(x >= 0 && complement >= 0))
    throw new RangeError(`regularizedIncompleteBeta: x must be in 0..1, got ${x}`);
  if (x === 0) return 0;
  if (complement === 0) return 1;
  const logFront = a * Math.log(x) + b * Math.log(complement) + logGamma(a + b) - logGamma(a) - logGamma(b);
  // The fraction converges fast only below the mean of the distribution; above it the mirror image does.
  if (x < (a + 1) / (a + b + 2)) return (Math.exp(logFront) * evaluateFraction(a, b, x)) / a;
  return 1 - (Math.exp(logFront) * evaluateFraction(b, a, complement)) / b;
}

function evaluateFraction(a: number, b: number, x: number): number {
  let c = 1;
  let d = 1 / keepFromZero(1 - ((a + b) * x) / (a + 1));
  let result = d;
  for (let m = 1; m <= 2000; m++) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / keepFromZero(1 + even * d);
    c = keepFromZero(1 + even / c);
    result *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / keepFromZero(1 + odd * d);
    c = keepFromZero(1 + odd / c);
    const step = d * c;
    result *= step;
    if (Math.abs(step - 1) < 1e-16) break;
  }
  return result;
}

function keepFromZero(value: number): number {
  return Math.abs(value) < tiny ? tiny : value;
}
