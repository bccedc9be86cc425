import type { Layout } from '../analysis/layout.ts';
import { dot } from '../linear-algebra/dot.ts';
import type { BeliefMixture } from './belief.ts';
import { type BeliefCell, weighSizes } from './effect-to-noise.ts';
import { type LeftOutReading, leaveOneOut } from './leave-one-out.ts';
import { type PriorStructure, priorLayoutOf } from './prior-layout.ts';

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
 * Posterior of the coefficients of all terms of up to three letters: normal priors of relative size by effect regularities, their common size, the
 * size of interactions among them and the noise unknown. Sizes are integrated by marginal likelihood over a grid, the noise itself in closed form.
 *
 * With K the prior covariance of the readings after the fixed columns are projected out, one eigendecomposition of K serves all sizes of noise.
 */
export function inferEffects(question: PosteriorQuestion): EffectPosterior {
  const { layout, y } = question;
  const n = y.length;
  const { terms, columns, roots, nuisance, structures } = priorLayoutOf(layout);
  const offset = y[0] ?? 0;
  const readings = y.map((value, row) => (value - offset) * (roots?.[row] ?? 1));
  const projected = nuisance.projectOut(readings);

  const priorDf = question.noise?.df ?? 0;
  // One reading alone says nothing of its noise; the mixture then has no width and no effect either.
  const df = Math.max(1, n - nuisance.rank + priorDf);
  const priorSs = priorDf * (question.noise?.sd ?? 0) ** 2;
  const cells = weighSizes({
    structures: structures.map((structure) => ({
      structure,
      scores: structure.vectors.map((vector) => dot(vector, projected)),
    })),
    df,
    priorSs,
  });

  const difference = (weights: readonly number[], shift = 0, extraSpread = 0): BeliefMixture => {
    const loads = new Map<PriorStructure, Load>();
    const parts = cells.map(({ structure, scores, r, noiseVariance, weight }) => {
      const { load, priorVariance } = loads.get(structure) ?? loadOf(structure, weights);
      loads.set(structure, { load, priorVariance });
      let mean = shift;
      let explained = 0;
      for (let index = 0; index < n; index++) {
        const share = r / (1 + r * (structure.eigenvalues[index] ?? 0));
        mean += share * (load[index] ?? 0) * (scores[index] ?? 0);
        explained += r * share * (load[index] ?? 0) ** 2;
      }
      const spread = Math.max(0, r * priorVariance - explained) + extraSpread;
      return { weight, mean, spread, noiseVariance };
    });
    return { df, parts };
  };

  return {
    terms: [...terms],
    means: posteriorMeans(terms.length, cells),
    noiseVariance: cells.reduce((sum, { noiseVariance, weight }) => sum + weight * noiseVariance, 0),
    difference: (weights) => difference(weights),
    level(weights) {
      // Given the coefficients, the constant is the mean of what they leave of the readings.
      const { row, variance } = nuisance.constant;
      const shifted = weights.map((weight, term) => weight - dot(row, columns[term] ?? []));
      return difference(shifted, offset + dot(row, readings), variance);
    },
    leaveOneOut: () => leaveOneOut({ cells, df, priorSs, nuisance, roots, readings: y }),
  };
}

/** A sum of coefficients on the eigenvectors, and its prior variance. */
interface Load {
  load: number[];
  priorVariance: number;
}

function loadOf({ variances, loadings, eigenvalues }: PriorStructure, weights: readonly number[]): Load {
  const load = new Array<number>(eigenvalues.length).fill(0);
  let priorVariance = 0;
  weights.forEach((weight, term) => {
    if (weight === 0) return;
    priorVariance += weight * weight * (variances[term] ?? 0);
    const loading = loadings[term] ?? [];
    for (let index = 0; index < load.length; index++)
      load[index] = (load[index] ?? 0) + weight * (loading[index] ?? 0);
  });
  return { load, priorVariance };
}

function posteriorMeans(terms: number, cells: readonly BeliefCell[]): number[] {
  const shrunk = new Map<PriorStructure, number[]>();
  for (const { structure, scores, r, weight } of cells) {
    const sums = shrunk.get(structure) ?? scores.map(() => 0);
    structure.eigenvalues.forEach((value, index) => {
      sums[index] = (sums[index] ?? 0) + (weight * r * (scores[index] ?? 0)) / (1 + r * value);
    });
    shrunk.set(structure, sums);
  }
  const means = new Array<number>(terms).fill(0);
  for (const [{ loadings }, sums] of shrunk)
    loadings.forEach((loading, term) => {
      means[term] = (means[term] ?? 0) + dot(loading, sums);
    });
  return means;
}
