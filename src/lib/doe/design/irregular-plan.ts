import { listTerms } from '../analysis/terms.ts';
import type { Brief } from '../brief.ts';
import { createColumnSpace } from '../linear-algebra/column-space.ts';
import { createUniformSource } from '../random/random-numbers.ts';
import { canShowMainEffects, listAllowedCorners } from './allowed-corners.ts';
import { expandPoint, invertInformation, predictionVariance } from './information.ts';
import { findOptimalSubsets } from './optimal-subset.ts';
import type { Alias } from './proposal.ts';
import { traceAliases } from './trace-aliases.ts';
import { lettersUpTo, readWord } from './words.ts';

/** Corners chosen around forbidden ones: not balanced, but as near to it as the rules allow. */
export interface IrregularPlan {
  corners: number[][];
  /** Main effects and, in the larger plans, the pairs that corners can still show. */
  terms: string[];
  aliases: Alias[];
  /** Variance of each term in a balanced plan of as many corners over its variance here. */
  efficiencies: { term: string; relative: number }[];
  /** Pairs of which some corner is never run, so that no plan could show how they work together. */
  emptied: string[];
  /** 5: pairs apart; 4: main effects apart from pairs; 3: not even that. Emptied pairs are not counted: their question cannot be asked. */
  resolution: 3 | 4 | 5;
}

const lowestMainEfficiency = 0.6;

/**
 * D-optimal subsets of the allowed corners, the smallest two that serve each purpose: all pairs that corners can still show, and main effects alone.
 *
 * Sizes are those at which small two-level plans are nearly balanced: multiples of four for the settings no rule touches, multiples of three for two
 * settings that share three of their four corners. Subsets that would know a main effect less than 60 % as well as a balanced plan are left out.
 */
export function findIrregularPlans(brief: Brief, largest: number): IrregularPlan[] {
  const corners = listAllowedCorners(brief);
  const letters = lettersUpTo(brief.factors.length);
  if (!canShowMainEffects(corners, letters.length)) return [];
  const withPairs = listShownTerms(corners, letters);
  const found = [withPairs, letters].flatMap((terms) => {
    if (!mayServe(corners, terms, letters.length)) return [];
    // More runs than these are better spent on pairs.
    const most = terms.length > letters.length ? largest : Math.min(largest, mostForMains);
    const plans: IrregularPlan[] = [];
    for (const size of sizes.filter((candidate) => candidate > terms.length && candidate <= most)) {
      const plan = planSubset({ corners, letters, size, terms });
      if (plan !== null) plans.push(plan);
      if (plans.length === plansEach) break;
    }
    return plans;
  });
  return found.filter(
    (plan, index) => found.findIndex((other) => other.corners.length === plan.corners.length) === index,
  );
}

const sizes = [4, 6, 8, 9, 10, 12, 14, 15, 16, 18, 20, 21, 24, 27, 28, 30, 32];
const plansEach = 2;
const mostForMains = 20;
const nearlyOptimal = 0.95;

/**
 * Whether it is worth searching: shares of the allowed corners, moved a few steps from equal ones towards the best (S.D. Silvey, D.M. Titterington &
 * B. Torsney, 1978, Communications in Statistics A 7), already know each main effect nearly well enough.
 */
function mayServe(corners: readonly number[][], terms: readonly string[], k: number): boolean {
  const rows = corners.map((x) => expandPoint(x, terms));
  let shares = rows.map(() => 1 / rows.length);
  let inverse: number[][] | null = null;
  // Larger models gain little and cost much per step.
  for (let step = 0; step < (terms.length > k ? 3 : 25); step++) {
    inverse = invertInformation(rows, shares);
    if (inverse === null) return false;
    const known = inverse;
    shares = rows.map(
      (row, index) => ((shares[index] ?? 0) * predictionVariance(row, known)) / (terms.length + 1),
    );
  }
  return terms
    .slice(0, k)
    .every((_, index) => relativeVariance(inverse, index, 1) > 0.92 * lowestMainEfficiency);
}

function relativeVariance(inverse: readonly number[][] | null, index: number, runs: number): number {
  return 1 / (runs * (inverse?.[index + 1]?.[index + 1] ?? Number.POSITIVE_INFINITY));
}

interface Subset {
  corners: readonly number[][];
  letters: readonly string[];
  size: number;
  terms: readonly string[];
}

/** Of the subsets that are as good as equal, the one whose worst main effect is known best; null where that is not well enough. */
function planSubset({ corners, letters, size, terms }: Subset): IrregularPlan | null {
  const rows = corners.map((x) => expandPoint(x, terms));
  const subsets = findOptimalSubsets({
    candidates: rows,
    size,
    // A fixed seed: the same brief always gets the same plans.
    random: createUniformSource(size),
    starts: terms.length > letters.length ? 2 : 5,
  });
  const measured = subsets
    .filter(({ relativeDeterminant }) => relativeDeterminant > nearlyOptimal)
    .map(({ chosen }) => ({
      chosen,
      efficiencies: measureEfficiencies(
        chosen.map((index) => rows[index] ?? []),
        terms,
      ),
    }));
  const [best] = measured.sort(
    (first, second) => worstMain(second.efficiencies) - worstMain(first.efficiencies),
  );
  if (best === undefined || worstMain(best.efficiencies) < lowestMainEfficiency - 1e-9) return null;
  const chosen = best.chosen.map((index) => [...(corners[index] ?? [])]);
  return {
    ...describeTies(chosen, { corners, letters, terms }),
    corners: chosen,
    terms: [...terms],
    efficiencies: best.efficiencies,
  };
}

type Efficiencies = IrregularPlan['efficiencies'];

function measureEfficiencies(rows: readonly number[][], terms: readonly string[]): Efficiencies {
  const inverse = invertInformation(rows);
  return terms.map((term, index) => ({ term, relative: relativeVariance(inverse, index, rows.length) }));
}

function worstMain(efficiencies: Efficiencies): number {
  return Math.min(...efficiencies.filter(({ term }) => term.length === 1).map(({ relative }) => relative));
}

function describeTies(
  chosen: readonly number[][],
  { corners, letters, terms }: Omit<Subset, 'size'>,
): Pick<IrregularPlan, 'aliases' | 'emptied' | 'resolution'> {
  const others = listTerms(letters, 2).filter((term) => !terms.includes(term));
  const aliases = traceAliases({ corners: chosen, terms, others });
  const emptied = others.filter((pair) => isEmptied(corners, pair));
  const mainsTied = aliases.some(
    ({ term, with: partners }) =>
      term.length === 1 && partners.some((partner) => !emptied.includes(partner.term)),
  );
  return { aliases, emptied, resolution: mainsTied ? 3 : others.length > emptied.length ? 4 : 5 };
}

/** Main effects, then every pair that the corners can tell from what came before. */
function listShownTerms(corners: readonly number[][], letters: readonly string[]): string[] {
  const space = createColumnSpace([corners.map(() => 1)]);
  return listTerms(letters, 2).filter((term) =>
    space.add(corners.map((x) => expandPoint(x, [term])[1] ?? 0)),
  );
}

/** Whether some corner of a pair is never run. */
function isEmptied(corners: readonly number[][], pair: string): boolean {
  const settings = [...pair].map((letter) => Math.log2(readWord(letter)));
  return new Set(corners.map((x) => settings.map((setting) => x[setting]).join(' '))).size < 4;
}
