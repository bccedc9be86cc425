import { logGamma } from './log-gamma.ts';

// ln(ratio) = 0, near the peak of the density, is where x = exp(-x).
const peakOfDensity = 0.5671432904097838;
const furthest = 20_000;

interface AverageOverChi {
  /** A smooth function of the estimated standard deviation in units of the true one, bounded by 1. */
  of: (ratio: number) => number;
  /** Degrees of freedom of the estimated standard deviation. */
  df: number;
  /** How fast `of` changes with ln(ratio): its fastest relative rate, 0 for a constant. */
  rate: number;
}

/**
 * Expected value of a function of s / sigma, where s is a standard deviation estimated with `df` degrees of freedom.
 *
 * Trapezoidal rule after ln(ratio) = x - exp(-x), which makes the integrand fall off double exponentially at both ends (Takahasi & Mori, 1974):
 * the rule then converges exponentially, also at fractional df, where rules over the ratio itself stall. The step follows the width of the density
 * and of the function; halving it changes results by less than 1e-13.
 */
export function averageOverChi({ of, df, rate }: AverageOverChi): number {
  const half = df / 2;
  const logFront = Math.log(2) + half * Math.log(half) - logGamma(half);
  const step = 0.25 / Math.sqrt(2 * df + rate * rate + 4);
  const weigh = (x: number) => {
    const inner = Math.exp(-x);
    const logRatio = x - inner;
    const logWeight = logFront + df * logRatio - half * Math.exp(2 * logRatio);
    return Math.exp(logWeight) * (1 + inner) * of(Math.exp(logRatio));
  };
  let sum = weigh(peakOfDensity);
  for (const direction of [-step, step]) {
    for (let index = 1; index <= furthest; index++) {
      const term = weigh(peakOfDensity + direction * index);
      sum += term;
      // The product rises to one peak and falls; once it no longer counts, nothing further out does.
      if (term < sum * 1e-18) break;
    }
  }
  // The average of something bounded by 1, whatever rounding adds.
  return Math.min(1, sum * step);
}
