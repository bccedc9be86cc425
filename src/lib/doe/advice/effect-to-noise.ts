/**
 * Standard deviation of an active main effect's coefficient over that of noise, from effects drowned in noise to noise hardly seen; a priori
 * spread around 0.7 by a factor of e either way.
 */
const RATIOS = Array.from({ length: 15 }, (_, index) => 0.04 * 1.6 ** index);
const USUAL_RATIO = 0.7;

export interface RatioCell {
  /** Squared ratio of effect size to noise. */
  r: number;
  noiseVariance: number;
  weight: number;
}

/** Weighs the ratios of effect size to noise by marginal likelihood; the noise itself is integrated out. */
export function weighRatios(known: {
  eigenvalues: readonly number[];
  scores: readonly number[];
  df: number;
  priorSs: number;
}): RatioCell[] {
  const { eigenvalues, scores, df, priorSs } = known;
  // A trial without any spread has no likelihood; the smallest positive spread keeps the weights finite.
  const least = Number.MIN_VALUE * 1e16;
  const cells = RATIOS.map((ratio) => {
    const r = ratio * ratio;
    let logDeterminant = 0;
    let ss = priorSs + least;
    eigenvalues.forEach((value, index) => {
      logDeterminant += Math.log1p(r * value);
      ss += (scores[index] ?? 0) ** 2 / (1 + r * value);
    });
    const logPrior = -(Math.log(ratio / USUAL_RATIO) ** 2) / 2;
    return { r, noiseVariance: ss / df, log: logPrior - 0.5 * logDeterminant - (df / 2) * Math.log(ss) };
  });
  const highest = Math.max(...cells.map((cell) => cell.log));
  const total = cells.reduce((sum, cell) => sum + Math.exp(cell.log - highest), 0);
  return cells
    .map(({ r, noiseVariance, log }) => ({ r, noiseVariance, weight: Math.exp(log - highest) / total }))
    .filter((cell) => cell.weight > 1e-4);
}
