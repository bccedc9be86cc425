import { logGamma } from './log-gamma.ts';

/** Both tails of the regularised incomplete gamma function at x: `lower` + `upper` = 1, the smaller one with all its digits. */
export interface GammaTails {
  lower: number;
  upper: number;
}

/**
 * Regularised incomplete gamma functions P(a, x) and Q(a, x): series below the mean (DLMF 8.7.1), continued fraction above it (DLMF 8.9.2).
 *
 * @throws RangeError when a is not above zero or x is below zero.
 */
export function regularizedIncompleteGamma(a: number, x: number): GammaTails {
  if (!(a > 0)) throw new RangeError(`regularizedIncompleteGamma: a must be above zero, got ${a}`);
  if (!(x >= 0)) throw new RangeError(`regularizedIncompleteGamma: x must not be below zero, got ${x}`);
  if (x === 0) return { lower: 0, upper: 1 };
  if (x === Number.POSITIVE_INFINITY) return { lower: 1, upper: 0 };
  const front = Math.exp(a * Math.log(x) - x - logGamma(a));
  if (x < a + 1) {
    const lower = front * sumSeries(a, x);
    return { lower, upper: 1 - lower };
  }
  const upper = front * evaluateFraction(a, x);
  return { lower: 1 - upper, upper };
}

function sumSeries(a: number, x: number): number {
  let term = 1 / a;
  let sum = term;
  for (let n = 1; n <= 5000 && term > sum * 1e-17; n++) {
    term *= x / (a + n);
    sum += term;
  }
  return sum;
}

function evaluateFraction(a: number, x: number): number {
  let b = x + 1 - a;
  let c = 1e300;
  let d = 1 / b;
  let result = d;
  for (let n = 1; n <= 5000; n++) {
    const numerator = -n * (n - a);
    b += 2;
    d = 1 / (numerator * d + b);
    c = b + numerator / c;
    const step = d * c;
    result *= step;
    if (Math.abs(step - 1) < 1e-16) break;
  }
  return result;
}
