import type { Layout } from '../analysis/layout.ts';
import { dot } from '../linear-algebra/dot.ts';
import type { BeliefMixture } from './belief.ts';
import { weighRatios } from './effect-to-noise.ts';
import { type LeftOutReading, leaveOneOut } from './leave-one-out.ts';
import { priorLayoutOf } from './prior-layout.ts';

export interface PosteriorQuestion {
  layout: Layout;
  /** Readings on the scale of the analysis, one a point. */
  y: readonly number[];
  /** What was known about the noise of a run before the readings. */
  noise?: { sd: number; df: number } | undefined;
}

/** What is believed about the coefficients after the readings, averaged over how big effects are against noise. */
export interface EffectPosterior {
  /** Terms of up to three letters, then 'bend': by how much the middle lies off the surface through the corners. */
  terms: string[];
  /** Posterior means of the coefficients, in the order of `terms`. */
  means: number[];
  /** Belief about a sum of the coefficients times `weights`. */
  difference(weights: readonly number[]): BeliefMixture;
  /** Belief about the result where the terms have the values `weights`: average over blocks. */
  level(weights: readonly number[]): BeliefMixture;
  /** Posterior mean of the noise variance of a run. */
  noiseVariance: number;
  /** Each reading against what all others make one expect. */
  leaveOneOut(): LeftOutReading[];
}

/**
 * Posterior of the coefficients of all terms of up to three letters: normal priors of relative size by effect regularities, their common size and
 * the noise unknown. Size and noise are integrated by marginal likelihood over a grid of their ratio, the noise itself in closed form.
 *
 * With K the prior covariance of the readings after the fixed columns are projected out, one eigendecomposition of K serves all ratios.
 */
export function inferEffects(question: PosteriorQuestion): EffectPosterior {
  const { layout, y } = question;
  const n = y.length;
  const { terms, variances, columns, roots, nuisance, eigenvalues, vectors, loadings } =
    priorLayoutOf(layout);
  const offset = y[0] ?? 0;
  const readings = y.map((value, row) => (value - offset) * (roots?.[row] ?? 1));
  const projected = nuisance.projectOut(readings);
  const scores = vectors.map((vector) => dot(vector, projected));

  const priorDf = question.noise?.df ?? 0;
  // One reading alone says nothing of its noise; the mixture then has no width and no effect either.
  const df = Math.max(1, n - nuisance.rank + priorDf);
  const priorSs = priorDf * (question.noise?.sd ?? 0) ** 2;
  const mixture = weighRatios({ eigenvalues, scores, df, priorSs });
  const shrunkScores = eigenvalues.map((value, index) =>
    mixture.reduce((sum, { r, weight }) => sum + (weight * r * (scores[index] ?? 0)) / (1 + r * value), 0),
  );

  const difference = (weights: readonly number[], shift = 0, extraSpread = 0): BeliefMixture => {
    const load = new Array<number>(n).fill(0);
    let priorVariance = 0;
    weights.forEach((weight, term) => {
      if (weight === 0) return;
      priorVariance += weight * weight * (variances[term] ?? 0);
      const loading = loadings[term] ?? [];
      for (let index = 0; index < n; index++)
        load[index] = (load[index] ?? 0) + weight * (loading[index] ?? 0);
    });
    return {
      df,
      parts: mixture.map(({ r, noiseVariance, weight }) => {
        let mean = shift;
        let explained = 0;
        for (let index = 0; index < n; index++) {
          const share = r / (1 + r * (eigenvalues[index] ?? 0));
          mean += share * (load[index] ?? 0) * (scores[index] ?? 0);
          explained += r * share * (load[index] ?? 0) ** 2;
        }
        const spread = Math.max(0, r * priorVariance - explained) + extraSpread;
        return { weight, mean, spread, noiseVariance };
      }),
    };
  };

  return {
    terms: [...terms],
    means: loadings.map((loading) => dot(loading, shrunkScores)),
    noiseVariance: mixture.reduce((sum, { noiseVariance, weight }) => sum + weight * noiseVariance, 0),
    difference: (weights) => difference(weights),
    level(weights) {
      // Given the coefficients, the constant is the mean of what they leave of the readings.
      const { row, variance } = nuisance.constant;
      const shifted = weights.map((weight, term) => weight - dot(row, columns[term] ?? []));
      return difference(shifted, offset + dot(row, readings), variance);
    },
    leaveOneOut: () =>
      leaveOneOut({ eigenvalues, vectors, scores, mixture, df, priorSs, nuisance, roots, readings: y }),
  };
}
