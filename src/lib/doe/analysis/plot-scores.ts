import { normalQuantile } from '../distributions/normal-quantile.ts';

/**
 * Share of the distribution below the i-th smallest of n values: 'blom' (i - 3/8) / (n + 1/4), next to what normal values have on average (G. Blom 1958,
 * Statistical Estimates and Transformed Beta-Variables); 'midpoint' (i - 1/2) / n, as C. Daniel drew his plots of effects (1959, Technometrics 1, 311-341).
 */
export type PlottingPosition = 'blom' | 'midpoint';

/**
 * Where values stand on the axis of a normal plot: in the order in which they are given, the score that a value of its rank would have if all were
 * normal around zero. Equal values share ranks in the order given.
 *
 * @throws RangeError when a value is not finite
 */
export function normalScores(values: readonly number[], position: PlottingPosition = 'blom'): number[] {
  return scoreByRank('normalScores', values, (rank, count) =>
    normalQuantile(shareBelow(rank, count, position)),
  );
}

/**
 * The same for sizes on a half-normal plot, signs left aside: effects that are nothing but noise lie on a line through zero.
 *
 * @throws RangeError when a value is not finite
 */
export function halfNormalScores(
  values: readonly number[],
  position: PlottingPosition = 'midpoint',
): number[] {
  return scoreByRank('halfNormalScores', values.map(Math.abs), (rank, count) =>
    normalQuantile(0.5 + 0.5 * shareBelow(rank, count, position)),
  );
}

function shareBelow(rank: number, count: number, position: PlottingPosition): number {
  return position === 'blom' ? (rank - 0.375) / (count + 0.25) : (rank - 0.5) / count;
}

function scoreByRank(
  name: string,
  values: readonly number[],
  scoreOf: (rank: number, count: number) => number,
): number[] {
  if (!values.every(Number.isFinite)) throw new RangeError(`${name}: values must be finite numbers`);
  const scores = new Array<number>(values.length).fill(0);
  values
    .map((value, place) => ({ value, place }))
    .sort((first, second) => first.value - second.value || first.place - second.place)
    .forEach(({ place }, index) => {
      scores[place] = scoreOf(index + 1, values.length);
    });
  return scores;
}
