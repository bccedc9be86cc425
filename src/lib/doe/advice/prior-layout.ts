import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import type { Layout } from '../analysis/layout.ts';
import { unitContrasts } from '../analysis/model-layout.ts';
import { listTerms, termColumn } from '../analysis/terms.ts';
import { dot } from '../linear-algebra/dot.ts';
import { INTERACTION_SIZES, priorVariance } from './effect-regularities.ts';
import { type NuisanceSpace, nuisanceSpace } from './nuisance-space.ts';

/** Prior variance of the bend, in units of that of an active main effect: half its size. */
const BEND_VARIANCE = 0.25;

/** The part of the posterior that does not depend on readings. */
export interface PriorLayout {
  /** Terms of up to three letters, then 'bend': by how much the middle lies off the surface through the corners. */
  terms: string[];
  /** Each run's row of the columns, times the root of its weight. */
  columns: number[][];
  /** Roots of the weights; undefined: all 1. */
  roots: readonly number[] | undefined;
  /** Constant and blocks, of which nothing is known beforehand. */
  nuisance: NuisanceSpace;
  /** One for each size that interactions may have against main effects. */
  structures: PriorStructure[];
}

/** What effects are expected if interactions have a certain size against main effects. */
export interface PriorStructure {
  /** Prior probability. */
  chance: number;
  /** Of the coefficients, in units of the variance of an active main effect. */
  variances: number[];
  /** Eigenvalues and eigenvectors of the prior covariance of the readings after the nuisance is projected out. */
  eigenvalues: number[];
  vectors: number[][];
  /** Of each coefficient on each eigenvector, times its prior variance. */
  loadings: number[][];
}

/** Prior of all effects at the points of a layout. */
export function priorLayoutOf(layout: Layout): PriorLayout {
  return layout.remember('prior', () => buildPrior(layout));
}

function buildPrior({ letters, points, weights }: Layout): PriorLayout {
  const roots = weights?.map(Math.sqrt);
  const rooted = (column: readonly number[]) =>
    roots ? column.map((value, row) => value * (roots[row] ?? 1)) : [...column];
  const terms = listTerms(letters, 3);
  const columns = [
    ...terms.map((term) => rooted(termColumn(term, letters, points))),
    rooted(points.map((point) => (point.center ? 1 : 0))),
  ];
  const fixed = [points.map(() => 1), ...unitContrasts(points.map((point) => point.block))];
  const nuisance = nuisanceSpace(fixed.map(rooted));
  const projected = columns.map((column) => nuisance.projectOut(column));
  return {
    terms: [...terms, 'bend'],
    columns,
    roots,
    nuisance,
    structures: INTERACTION_SIZES.map(({ chance, sizes }) => {
      const variances = [...terms.map((term) => priorVariance(term, sizes)), BEND_VARIANCE];
      const { eigenvalues, vectors } = decompose(projected, variances, points.length);
      const loadings = projected.map((column, index) => {
        const variance = variances[index] ?? 0;
        return vectors.map((vector) => variance * dot(vector, column));
      });
      return { chance, variances, eigenvalues, vectors, loadings };
    }),
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
