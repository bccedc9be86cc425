import type { PriorStructure } from './prior-layout.ts';

/**
 * Standard deviation of an active main effect's coefficient over that of noise, from effects drowned in noise to noise hardly seen. A priori it is
 * around 1, up to seven times more or less in two cases of three: a narrower belief takes quiet trials for noisier than they are, so that more check
 * runs than 95 in 100 fall inside the predicted range.
 */
const RATIOS = Array.from({ length: 15 }, (_, index) => 0.04 * 1.6 ** index);
const LOG_SPREAD = 2;

/** Cells with a smaller weight than this change nothing that is shown. */
const NEGLIGIBLE = 1e-3;

/** How big effects are against noise, and interactions against main effects, with how likely that is after the readings. */
export interface BeliefCell {
  structure: PriorStructure;
  /** The readings on the structure's eigenvectors. */
  scores: readonly number[];
  /** Squared ratio of effect size to noise. */
  r: number;
  noiseVariance: number;
  weight: number;
}

/** Weighs sizes by marginal likelihood; the noise itself is integrated out. */
export function weighSizes(known: {
  structures: readonly { structure: PriorStructure; scores: readonly number[] }[];
  df: number;
  priorSs: number;
}): BeliefCell[] {
  const { structures, df, priorSs } = known;
  // A trial without any spread has no likelihood; the smallest positive spread keeps the weights finite.
  const least = Number.MIN_VALUE * 1e16;
  const cells = structures.flatMap(({ structure, scores }) =>
    RATIOS.map((ratio) => {
      const r = ratio * ratio;
      // A product of a few factors at a time: logarithms are dear, and all factors together may be no finite number.
      let logDeterminant = 0;
      let product = 1;
      let ss = priorSs + least;
      structure.eigenvalues.forEach((value, index) => {
        product *= 1 + r * value;
        if (product > 1e200) {
          logDeterminant += Math.log(product);
          product = 1;
        }
        ss += (scores[index] ?? 0) ** 2 / (1 + r * value);
      });
      const logPrior = Math.log(structure.chance) - (Math.log(ratio) / LOG_SPREAD) ** 2 / 2;
      const log = logPrior - 0.5 * (logDeterminant + Math.log(product)) - (df / 2) * Math.log(ss);
      return { structure, scores, r, noiseVariance: ss / df, log };
    }),
  );
  const highest = Math.max(...cells.map((cell) => cell.log));
  const likely = cells
    .map(({ log, ...cell }) => ({ ...cell, weight: Math.exp(log - highest) }))
    .filter(({ weight }) => weight > NEGLIGIBLE);
  const total = likely.reduce((sum, { weight }) => sum + weight, 0);
  return likely.map((cell) => ({ ...cell, weight: cell.weight / total }));
}
