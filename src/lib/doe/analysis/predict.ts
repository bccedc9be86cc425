import { studentTUpperQuantile } from '../distributions/student-t.ts';
import type { Analysis } from './analysis.ts';
import { termValue } from './terms.ts';

export interface Prediction {
  /** Average over blocks, on the scale of the analysis; middle runs count as off the corners' surface by `bendRange`. */
  fit: number;
  seFit: number | null;
  /** Of the mean of many runs. */
  ci: [number, number] | null;
  /** Of one new run. */
  pi: [number, number] | null;
  /** Of one single part of a new run. */
  piPart?: [number, number];
  /** Where the mean may lie when the result bends between low and high: lowest and highest, over the interval of the curvature. */
  bendRange?: [number, number];
}

/**
 * Prediction at a point in coded units: average over blocks, without the curvature term.
 *
 * @throws RangeError when `x` has not one finite setting for each factor
 */
export function predict(analysis: Analysis, x: readonly number[]): Prediction {
  const { basis, intercept, terms } = analysis;
  if (x.length !== basis.letters.length || !x.every(Number.isFinite))
    throw new RangeError(`predict: x must have ${basis.letters.length} finite settings, got ${x.join(', ')}`);
  const values = terms.map((term) => termValue(term.term, basis.letters, x));
  const fit = terms.reduce(
    (sum, term, index) => sum + term.coefficient * (values[index] ?? 0),
    intercept.coefficient,
  );
  const bend = bendRange(analysis, x, fit);
  const spread = spreadOfMean(analysis, values);
  if (spread === null) return { fit, seFit: null, ci: null, pi: null, ...(bend && { bendRange: bend }) };

  const { variance, limit } = spread;
  const around = (wide: number): [number, number] => [
    fit - limit * Math.sqrt(wide),
    fit + limit * Math.sqrt(wide),
  ];
  const run = (analysis.error.sd ?? 0) ** 2;
  const { within } = analysis;
  return {
    fit,
    seFit: Math.sqrt(variance),
    ci: around(variance),
    pi: around(variance + run),
    ...(within && { piPart: around(variance + run + within.sd ** 2 * (1 - 1 / within.parts)) }),
    ...(bend && { bendRange: bend }),
  };
}

/** Variance of the fitted mean and the half-width of its intervals in standard errors. */
function spreadOfMean(
  analysis: Analysis,
  values: readonly number[],
): { variance: number; limit: number } | null {
  const { basis, error, terms } = analysis;
  if (error.sd === null || basis.limit === null) return null;
  const skipped = new Array<number>(basis.blockColumns + (basis.hasCurvature ? 1 : 0)).fill(0);
  const point = [1, ...skipped, ...values];
  const all = quadraticForm(basis.covariance, point);
  if (error.strata === undefined) return { variance: error.sd ** 2 * all, limit: basis.limit };

  const [whole, sub] = ['whole', 'sub'].map((name) => error.strata?.find((stratum) => stratum.name === name));
  if (whole?.sd == null || sub?.sd == null) return null;
  const inWhole = [
    1,
    ...skipped,
    ...values.map((value, index) => (terms[index]?.stratum === 'whole' ? value : 0)),
  ];
  const wholeShare = quadraticForm(basis.covariance, inWhole);
  const parts = [
    { variance: whole.sd ** 2 * wholeShare, df: whole.df },
    { variance: sub.sd ** 2 * Math.max(0, all - wholeShare), df: sub.df },
  ];
  const variance = parts.reduce((sum, part) => sum + part.variance, 0);
  return { variance, limit: satterthwaiteLimit(parts, basis) };
}

/** Degrees of freedom of a sum of variances (F. E. Satterthwaite, 1946, Biometrics Bulletin 2, 110-114). */
function satterthwaiteLimit(
  parts: readonly { variance: number; df: number | null }[],
  basis: Analysis['basis'],
): number {
  let weighted = 0;
  let total = 0;
  for (const { variance, df } of parts) {
    if (df === null) return basis.limit ?? 0;
    total += variance;
    weighted += (variance * variance) / df;
  }
  return weighted > 0
    ? studentTUpperQuantile(basis.alpha / 2, (total * total) / weighted)
    : (basis.limit ?? 0);
}

/**
 * The model is anchored on the corners. Where a number setting stands between low and high the result is off that surface by a share of each
 * setting's bend, 1 - x² of it; their sum is known, not whose they are, so each may carry all of it.
 */
function bendRange(analysis: Analysis, x: readonly number[], fit: number): [number, number] | undefined {
  const { curvature, basis } = analysis;
  if (curvature === undefined) return undefined;
  const shares = x.flatMap((value, index) => (basis.kinds[index] === 'number' ? [1 - value * value] : []));
  const least = Math.min(...shares);
  const most = Math.max(...shares);
  if (Math.max(Math.abs(least), Math.abs(most)) < 1e-9) return undefined;
  const bends = curvature.ci ?? [curvature.estimate, curvature.estimate];
  const ends = bends.flatMap((bend) => [fit - bend * least, fit - bend * most]);
  return [Math.min(...ends), Math.max(...ends)];
}

function quadraticForm(matrix: readonly (readonly number[])[], point: readonly number[]): number {
  return matrix.reduce(
    (sum, row, index) =>
      sum + (point[index] ?? 0) * row.reduce((inner, value, other) => inner + value * (point[other] ?? 0), 0),
    0,
  );
}
