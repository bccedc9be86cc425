import { lettersOf, listTerms } from '../analysis/terms.ts';

/**
 * How often effects of real processes are active and how big they are, from 113 published full factorials (Li, Sudarsanam & Frey 2006, Complexity
 * 11, 32-45): few main effects, fewer interactions, mostly between active parents. Active effects are taken as ten times as big as the others.
 */
export const REGULARITIES = {
  mainActive: 0.41,
  /** By number of active parents. */
  pairActive: [0.005, 0.045, 0.33],
  tripleActive: [0.001, 0.012, 0.067, 0.15],
  /** Standard deviation of an active effect over that of an active main effect, by number of letters. */
  size: [0, 1, 1 / 3.6, 1 / 7.3],
  inactiveSize: 0.1,
} as const;

/** A term with the variance of its effect before any reading, in units of that of an active main effect. */
export interface PriorTerm {
  term: string;
  variance: number;
}

/** All terms of up to three letters with their prior variances, averaged over which settings are active. */
export function priorTerms(letters: readonly string[]): PriorTerm[] {
  return listTerms(letters, 3).map((term) => ({ term, variance: priorVariance(term) }));
}

/** Prior variance of a term's coefficient, its published size multiplied by `sizes` of its number of letters. */
export function priorVariance(term: string, sizes: readonly number[] = [1, 1, 1, 1]): number {
  const order = lettersOf(term).length;
  return averageVariance(order) * (sizes[order] ?? 1) ** 2;
}

/**
 * How big interactions may be against main effects, as multiples of the published size by number of letters: in three processes of four as published, in
 * one as big as main effects. The readings decide between the two; believing in the published size alone, the best bet took big interactions for noise
 * and fell up to a tenth of the possible improvement below plain estimates in such processes.
 */
export const INTERACTION_SIZES: readonly { chance: number; sizes: readonly number[] }[] = [
  { chance: 0.75, sizes: [1, 1, 1, 1] },
  { chance: 0.25, sizes: REGULARITIES.size.map((size, letters) => (letters === 0 ? 1 : 1 / size)) },
];

function averageVariance(order: number): number {
  const { mainActive, pairActive, tripleActive, size, inactiveSize } = REGULARITIES;
  const byParents: readonly number[] = order === 2 ? pairActive : tripleActive;
  const active =
    order === 1
      ? mainActive
      : byParents.reduce((sum, chance, parents) => sum + chance * binomial(order, parents, mainActive), 0);
  return (size[order] ?? 0) ** 2 * (active + (1 - active) * inactiveSize ** 2);
}

function binomial(n: number, hits: number, chance: number): number {
  let ways = 1;
  for (let i = 0; i < hits; i++) ways = (ways * (n - i)) / (i + 1);
  return ways * chance ** hits * (1 - chance) ** (n - hits);
}
