import { studentTTwoSided, studentTUpperQuantile } from '../distributions/student-t.ts';
import type { BeliefCell } from './effect-to-noise.ts';
import type { NuisanceSpace } from './nuisance-space.ts';

export interface LeftOutReading {
  /** Two-sided tail probability of the reading given all others; 1 where they say nothing. */
  p: number;
  /** Expected reading and the limits it would keep 95 times in 100; null where the others say nothing. */
  expected: { mean: number; low: number; high: number } | null;
}

/**
 * Leave-one-out predictions of the same model in closed form: with G the inverse covariance after the fixed columns, a left-out residual is
 * (G y)_i / G_ii with variance 1 / G_ii times the noise (S. Sundararajan & S. S. Keerthi, 2001, Neural Computation 13).
 */
export function leaveOneOut(known: {
  cells: readonly BeliefCell[];
  df: number;
  priorSs: number;
  nuisance: NuisanceSpace;
  roots: readonly number[] | undefined;
  readings: readonly number[];
}): LeftOutReading[] {
  const { cells, df, priorSs, nuisance, roots, readings } = known;
  return readings.map((reading, row) => {
    let p = 0;
    let mean = 0;
    let halfWidth = 0;
    for (const { structure, scores, r, weight } of cells) {
      const { eigenvalues, vectors } = structure;
      let precision = -nuisance.leverage(row);
      let pulled = 0;
      let ss = priorSs;
      eigenvalues.forEach((value, index) => {
        const share = 1 / (1 + r * value);
        const component = vectors[index]?.[row] ?? 0;
        precision += component * component * share;
        pulled += component * share * (scores[index] ?? 0);
        ss += share * (scores[index] ?? 0) ** 2;
      });
      const left = ss - (pulled * pulled) / precision;
      if (!(precision > 1e-6) || df <= 2 || !(left > 1e-9 * ss)) return { p: 1, expected: null };
      const scale = Math.sqrt(left / (df - 1) / precision) / (roots?.[row] ?? 1);
      const residual = pulled / precision / (roots?.[row] ?? 1);
      p += weight * studentTTwoSided(Math.abs(residual) / scale, df - 1);
      mean += weight * (reading - residual);
      halfWidth += weight * scale;
    }
    const wide = halfWidth * studentTUpperQuantile(0.025, df - 1);
    return { p, expected: { mean, low: mean - wide, high: mean + wide } };
  });
}
