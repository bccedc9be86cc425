import { multiply } from './regular-plan.ts';
import { readWord } from './words.ts';

/**
 * Inverse of the information matrix X'X of some rows, each counted as often as its weight says (once if not given); null where they cannot estimate
 * all columns.
 */
export function invertInformation(
  rows: readonly (readonly number[])[],
  weights?: readonly number[],
): number[][] | null {
  const size = rows[0]?.length ?? 0;
  const matrix = Array.from({ length: size }, () => new Array<number>(size).fill(0));
  for (const [run, row] of rows.entries()) {
    const weight = weights?.[run] ?? 1;
    for (let i = 0; i < size; i++) {
      const line = matrix[i] ?? [];
      for (let j = 0; j < size; j++) line[j] = (line[j] ?? 0) + weight * (row[i] ?? 0) * (row[j] ?? 0);
    }
  }
  return invertPositive(matrix);
}

/** Variance of the fitted value at a model row, for a run variance of 1. */
export function predictionVariance(row: readonly number[], inverse: readonly (readonly number[])[]): number {
  return row.reduce(
    (sum, value, i) =>
      sum + value * (inverse[i] ?? []).reduce((inner, entry, j) => inner + entry * (row[j] ?? 0), 0),
    0,
  );
}

/** Inverse of a symmetric positive definite matrix; null where it is singular to rounding. */
export function invertPositive(matrix: readonly (readonly number[])[]): number[][] | null {
  const size = matrix.length;
  const factor = Array.from({ length: size }, () => new Array<number>(size).fill(0));
  const at = (grid: readonly (readonly number[])[], i: number, j: number) => grid[i]?.[j] ?? 0;
  for (let i = 0; i < size; i++) {
    for (let j = 0; j <= i; j++) {
      let sum = at(matrix, i, j);
      for (let m = 0; m < j; m++) sum -= at(factor, i, m) * at(factor, j, m);
      if (i === j && sum <= 1e-9 * at(matrix, i, i)) return null;
      const row = factor[i];
      if (row) row[j] = i === j ? Math.sqrt(sum) : sum / at(factor, j, j);
    }
  }
  const columns = Array.from({ length: size }, (_, unit) => solveTriangular(factor, unit));
  return Array.from({ length: size }, (_, i) => columns.map((column) => column[i] ?? 0));
}

function solveTriangular(factor: readonly (readonly number[])[], unit: number): number[] {
  const size = factor.length;
  const x = new Array<number>(size).fill(0);
  for (let i = 0; i < size; i++) {
    let sum = i === unit ? 1 : 0;
    for (let m = 0; m < i; m++) sum -= (factor[i]?.[m] ?? 0) * (x[m] ?? 0);
    x[i] = sum / (factor[i]?.[i] ?? 1);
  }
  for (let i = size - 1; i >= 0; i--) {
    let sum = x[i] ?? 0;
    for (let m = i + 1; m < size; m++) sum -= (factor[m]?.[i] ?? 0) * (x[m] ?? 0);
    x[i] = sum / (factor[i]?.[i] ?? 1);
  }
  return x;
}

/** Model row of a point: 1 for the mean, then the value of each term. */
export function expandPoint(x: readonly number[], terms: readonly string[]): number[] {
  return [1, ...terms.map((term) => multiply(readWord(term), x))];
}
