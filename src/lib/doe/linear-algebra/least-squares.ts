import { Matrix, QrDecomposition } from 'ml-matrix';
import { dot } from './dot.ts';

/** A model matrix made ready for any number of responses; all arrays go by column or by row of the matrix that was given. */
export interface FactoredModel {
  /** Columns in the model. */
  parameters: number;
  /** Runs minus columns. */
  residualDf: number;
  /** Diagonal of (X'WX)^-1: variance of each coefficient for error variance 1. */
  variances: readonly number[];
  /** How much each run determines its own fitted value, 0 to 1. */
  leverage: readonly number[];
  fit(y: readonly number[]): LeastSquaresFit;
  /** (X'WX)^-1: covariances of the coefficients for error variance 1. */
  covariance(): number[][];
}

export interface LeastSquaresFit {
  coefficients: number[];
  fitted: number[];
  /** Reading minus fitted. */
  residuals: number[];
  /** Weighted sum of squared residuals. */
  residualSs: number;
}

/**
 * Weighted least squares by Householder QR of the columns scaled to length one.
 *
 * Readings are taken from their first value before the fit, so that a big common offset costs no digits.
 *
 * @param columns independent columns, the first of them all ones; see `createColumnSpace`
 * @param weights one per run; a weight of 2 means half the variance
 * @throws RangeError when there are more columns than runs.
 */
export function factorModel(
  columns: readonly (readonly number[])[],
  weights?: readonly number[],
): FactoredModel {
  const runs = columns[0]?.length ?? 0;
  const parameters = columns.length;
  if (parameters === 0 || parameters > runs)
    throw new RangeError(`factorModel: columns must be 1 to ${runs}, got ${parameters}`);
  const roots = weights?.map(Math.sqrt);
  const lengths = columns.map((column) =>
    Math.hypot(...(roots ? column.map((value, row) => value * (roots[row] ?? 1)) : column)),
  );
  const scaled = new Matrix(runs, parameters);
  for (let column = 0; column < parameters; column++)
    for (let row = 0; row < runs; row++)
      scaled.set(row, column, ((columns[column]?.[row] ?? 0) * (roots?.[row] ?? 1)) / (lengths[column] ?? 1));
  const decomposition = new QrDecomposition(scaled);
  const orthogonal = decomposition.orthogonalMatrix.to2DArray();
  const inverse = invertUpper(decomposition.upperTriangularMatrix.to2DArray());

  return {
    parameters,
    residualDf: runs - parameters,
    variances: inverse.map((row, column) => dot(row, row) / (lengths[column] ?? 1) ** 2),
    leverage: orthogonal.map((row) => snapToOne(dot(row, row))),
    covariance: () =>
      inverse.map((first, row) =>
        inverse.map((second, column) => dot(first, second) / ((lengths[row] ?? 1) * (lengths[column] ?? 1))),
      ),
    fit(y) {
      const offset = y[0] ?? 0;
      const centered = y.map((value, row) => (value - offset) * (roots?.[row] ?? 1));
      const projected = Array.from({ length: parameters }, (_, column) =>
        orthogonal.reduce((sum, row, index) => sum + (row[column] ?? 0) * (centered[index] ?? 0), 0),
      );
      const solved = inverse.map((row, column) => dot(row, projected) / (lengths[column] ?? 1));
      const fittedFromOffset = Array.from({ length: runs }, (_, row) =>
        solved.reduce((sum, coefficient, column) => sum + coefficient * (columns[column]?.[row] ?? 0), 0),
      );
      const residuals = fittedFromOffset.map((value, row) => (y[row] ?? 0) - offset - value);
      return {
        coefficients: solved.map((coefficient, column) =>
          column === 0 ? coefficient + offset : coefficient,
        ),
        fitted: fittedFromOffset.map((value) => value + offset),
        residuals,
        residualSs: residuals.reduce((sum, value, row) => sum + value * value * (weights?.[row] ?? 1), 0),
      };
    },
  };
}

// A run that alone determines its fitted value has leverage one; rounding must not turn that into a division by almost nothing.
function snapToOne(leverage: number): number {
  return leverage > 1 - 1e-9 ? 1 : leverage;
}

function invertUpper(upper: readonly (readonly number[])[]): number[][] {
  const size = upper.length;
  const inverse = Array.from({ length: size }, () => new Array<number>(size).fill(0));
  for (let column = 0; column < size; column++) {
    for (let row = column; row >= 0; row--) {
      let sum = row === column ? 1 : 0;
      for (let inner = row + 1; inner <= column; inner++)
        sum -= (upper[row]?.[inner] ?? 0) * (inverse[inner]?.[column] ?? 0);
      const target = inverse[row];
      if (target) target[column] = sum / (upper[row]?.[row] ?? 1);
    }
  }
  return inverse;
}
