import type { UniformSource } from '../random/random-numbers.ts';

interface SubsetQuestion {
  /** Model rows of all points that may be run. */
  candidates: readonly (readonly number[])[];
  /** How many of them to run; a point may be run more than once. */
  size: number;
  random: UniformSource;
  /** Fresh random starts; the best result counts. */
  starts: number;
}

const ridge = 1e-6;

/** A subset that no exchange of one point improves. */
export interface OptimalSubset {
  /** Indices of candidates, sorted. */
  chosen: number[];
  /** Determinant of X'X to the power of one over the number of columns, over that of the best subset found. */
  relativeDeterminant: number;
}

/**
 * D-optimal subsets: those with the largest determinant of X'X that exchanging single points can reach from random starts, best first. Empty where no
 * subset determines the model.
 *
 * Exchanges and their gain by V.V. Fedorov (1972), Theory of Optimal Experiments; one design point at a time as in R.D. Cook & C.J. Nachtsheim
 * (1980), Technometrics 22, 315-324.
 */
export function findOptimalSubsets({ candidates, size, random, starts }: SubsetQuestion): OptimalSubset[] {
  const columns = candidates[0]?.length ?? 0;
  if (size < columns || candidates.length === 0) return [];
  const points = candidates.map((row) => Float64Array.from(row));
  const found = Array.from({ length: starts }, () => improveSubset(startSubset(points, size, random)))
    // The ridge lets a poor start be improved; a subset that misses a column still shows it as a tiny factor of the determinant.
    .filter(({ logDeterminant }) => logDeterminant > columns * Math.log(0.05))
    .sort((first, second) => second.logDeterminant - first.logDeterminant);
  const best = found[0]?.logDeterminant ?? 0;
  return found.map(({ chosen, logDeterminant }) => ({
    chosen: chosen.sort((a, b) => a - b),
    relativeDeterminant: Math.exp((logDeterminant - best) / columns),
  }));
}

interface Subset {
  points: readonly Float64Array[];
  chosen: number[];
  /** (X'X + ridge)^-1. */
  inverse: Float64Array[];
  logDeterminant: number;
}

/** Half at random, the rest by whatever is least known so far: never hopelessly singular, seldom twice the same. */
function startSubset(points: readonly Float64Array[], size: number, random: UniformSource): Subset {
  const columns = points[0]?.length ?? 0;
  const inverse = Array.from({ length: columns }, (_, i) =>
    new Float64Array(columns).fill(1 / ridge, i, i + 1),
  );
  const subset: Subset = { points, chosen: [], inverse, logDeterminant: columns * Math.log(ridge) };
  while (subset.chosen.length < size) {
    const atRandom = subset.chosen.length < size / 2;
    const next = atRandom ? Math.floor(random() * points.length) : findLeastKnown(subset);
    subset.chosen.push(next);
    changeBy(subset, next, 1);
  }
  return subset;
}

function improveSubset(subset: Subset): Subset {
  const { points, chosen } = subset;
  let known = lookAtAll(subset);
  for (let pass = 0; pass < 20; pass++) {
    let improved = false;
    for (const [place, leaving] of chosen.entries()) {
      const { entering, gain } = findBestExchange(points, known, leaving);
      if (gain <= 1 + 1e-8) continue;
      changeBy(subset, entering, 1);
      changeBy(subset, leaving, -1);
      chosen[place] = entering;
      known = lookAtAll(subset);
      improved = true;
    }
    if (!improved) break;
  }
  return subset;
}

interface Known {
  /** Inverse times each point. */
  images: Float64Array[];
  /** Variance of the prediction at each point. */
  variances: Float64Array;
}

function lookAtAll({ points, inverse }: Subset): Known {
  const images = points.map((point) => multiplyInverse(inverse, point));
  return {
    images,
    variances: Float64Array.from(points, (point, index) => dot(point, images[index] ?? point)),
  };
}

/** Which point should take the place of one, and by which factor the determinant would grow. */
function findBestExchange(
  points: readonly Float64Array[],
  { images, variances }: Known,
  leaving: number,
): { entering: number; gain: number } {
  const toward = images[leaving] ?? new Float64Array(0);
  const rest = 1 - (variances[leaving] ?? 0);
  let entering = leaving;
  let gain = 0;
  for (const [index, point] of points.entries()) {
    const shared = dot(point, toward);
    const factor = (1 + (variances[index] ?? 0)) * rest + shared * shared;
    if (factor > gain + 1e-12) [entering, gain] = [index, factor];
  }
  return { entering, gain };
}

function findLeastKnown(subset: Subset): number {
  const { variances } = lookAtAll(subset);
  return variances.reduce(
    (least, variance, index) => (variance > (variances[least] ?? 0) * (1 + 1e-9) ? index : least),
    0,
  );
}

/** Adds (sign 1) or takes away (sign -1) a point (J. Sherman & W.J. Morrison, 1950, Annals of Mathematical Statistics 21, 124-127). */
function changeBy(subset: Subset, index: number, sign: 1 | -1): void {
  const row = subset.points[index] ?? new Float64Array(0);
  const image = multiplyInverse(subset.inverse, row);
  const factor = 1 + sign * dot(row, image);
  subset.logDeterminant += Math.log(factor);
  for (const [i, line] of subset.inverse.entries()) {
    const weight = (sign / factor) * (image[i] ?? 0);
    for (let j = 0; j < line.length; j++) line[j] = (line[j] ?? 0) - weight * (image[j] ?? 0);
  }
}

function multiplyInverse(inverse: readonly Float64Array[], row: Float64Array): Float64Array {
  const image = new Float64Array(inverse.length);
  for (let i = 0; i < image.length; i++) image[i] = dot(inverse[i] ?? row, row);
  return image;
}

function dot(first: Float64Array, second: Float64Array): number {
  let sum = 0;
  for (let index = 0; index < first.length; index++) sum += (first[index] ?? 0) * (second[index] ?? 0);
  return sum;
}
