import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { termColumn } from '../analysis/terms.ts';
import { dot } from '../linear-algebra/dot.ts';
import type { BeliefMixture } from './belief.ts';
import { priorTerms } from './effect-regularities.ts';
import { weighRatios } from './effect-to-noise.ts';
import { type LeftOutReading, leaveOneOut } from './leave-one-out.ts';
import { nuisanceSpace } from './nuisance-space.ts';

export interface PosteriorQuestion {
  letters: readonly string[];
  runs: readonly { x: readonly number[]; y: number; center?: boolean }[];
  weights?: readonly number[] | undefined;
  /** Columns of which nothing is known beforehand: the constant first, then blocks. */
  fixed: readonly (readonly number[])[];
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

/** Prior variance of the bend, in units of that of an active main effect: half its size. */
const BEND_VARIANCE = 0.25;

/**
 * Posterior of the coefficients of all terms of up to three letters: normal priors of relative size by effect regularities, their common size and
 * the noise unknown. Size and noise are integrated by marginal likelihood over a grid of their ratio, the noise itself in closed form.
 *
 * With K the prior covariance of the readings after the fixed columns are projected out, one eigendecomposition of K serves all ratios.
 */
export function inferEffects(question: PosteriorQuestion): EffectPosterior {
  const { letters, runs, fixed } = question;
  const n = runs.length;
  const prior = [
    ...priorTerms(letters).map(({ term, variance }) => ({
      term,
      variance,
      column: termColumn(term, letters, runs),
    })),
    { term: 'bend', variance: BEND_VARIANCE, column: runs.map((run) => (run.center ? 1 : 0)) },
  ];
  const roots = question.weights?.map(Math.sqrt);
  const rooted = (column: readonly number[]) =>
    roots ? column.map((value, row) => value * (roots[row] ?? 1)) : column;
  const offset = runs[0]?.y ?? 0;
  const readings = rooted(runs.map((run) => run.y - offset));
  const nuisance = nuisanceSpace(fixed.map(rooted));
  const y = nuisance.projectOut(readings);
  const columns = prior.map(({ column }) => nuisance.projectOut(rooted(column)));
  const variances = prior.map(({ variance }) => variance);

  const { eigenvalues, vectors } = decompose(columns, variances, n);
  const scores = vectors.map((vector) => dot(vector, y));
  // Loading of each coefficient on each eigenvector, times its prior variance.
  const loadings = columns.map((column, index) => {
    const variance = variances[index] ?? 0;
    return vectors.map((vector) => variance * dot(vector, column));
  });

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
    terms: prior.map(({ term }) => term),
    means: loadings.map((loading) => dot(loading, shrunkScores)),
    noiseVariance: mixture.reduce((sum, { noiseVariance, weight }) => sum + weight * noiseVariance, 0),
    difference: (weights) => difference(weights),
    level(weights) {
      // Given the coefficients, the constant is the mean of what they leave of the readings.
      const { row, variance } = nuisance.constant;
      const shifted = weights.map((weight, term) => weight - dot(row, rooted(prior[term]?.column ?? [])));
      return difference(shifted, offset + dot(row, readings), variance);
    },
    leaveOneOut: () =>
      leaveOneOut({ eigenvalues, vectors, scores, mixture, df, priorSs, nuisance, roots, runs }),
  };
}

function decompose(columns: readonly (readonly number[])[], variances: readonly number[], n: number) {
  const kernel = Array.from({ length: n }, () => new Array<number>(n).fill(0));
  columns.forEach((column, index) => {
    for (let row = 0; row < n; row++) {
      const value = (variances[index] ?? 0) * (column[row] ?? 0);
      const target = kernel[row];
      if (value === 0 || target === undefined) continue;
      for (let other = 0; other < n; other++)
        target[other] = (target[other] ?? 0) + value * (column[other] ?? 0);
    }
  });
  const decomposition = new EigenvalueDecomposition(new Matrix(kernel), { assumeSymmetric: true });
  return {
    eigenvalues: decomposition.realEigenvalues.map((value) => Math.max(0, value)),
    vectors: decomposition.eigenvectorMatrix.transpose().to2DArray(),
  };
}
