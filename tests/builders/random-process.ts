import { REGULARITIES } from '../../src/lib/doe/advice/effect-regularities.ts';
import { lettersOf, listTerms } from '../../src/lib/doe/analysis/terms.ts';

/** A simulated process: the true coefficients of all terms of up to three letters around a center of zero. */
export interface RandomProcess {
  letters: string[];
  terms: string[];
  coefficients: number[];
  /** Number of active main effects. */
  activeMains: number;
  valueAt(x: readonly number[]): number;
}

export interface ProcessRules {
  mainActive: number;
  pairActive: readonly number[];
  tripleActive: readonly number[];
  size: readonly number[];
  inactiveSize: number;
}

/** Draws a process by published effect regularities (Li, Sudarsanam & Frey 2006), or by other rules; an active main coefficient has sd 1. */
export function drawProcess(
  letters: string[],
  random: { uniform: () => number; normal: () => number },
  rules: ProcessRules = REGULARITIES,
): RandomProcess {
  const active = new Set<string>();
  const terms = listTerms(letters, 3);
  const coefficients = terms.map((term) => {
    const parents = lettersOf(term);
    const activeParents = parents.filter((parent) => active.has(parent)).length;
    const chances = { 1: [rules.mainActive], 2: rules.pairActive, 3: rules.tripleActive }[term.length] ?? [];
    const isActive = random.uniform() < (chances[term.length === 1 ? 0 : activeParents] ?? 0);
    if (isActive && term.length === 1) active.add(term);
    const size = (rules.size[term.length] ?? 0) * (isActive ? 1 : rules.inactiveSize);
    return size * random.normal();
  });
  const places = terms.map((term) => lettersOf(term).map((letter) => letters.indexOf(letter)));
  return {
    letters,
    terms,
    coefficients,
    activeMains: active.size,
    valueAt: (x) =>
      coefficients.reduce(
        (sum, coefficient, index) =>
          sum + (places[index] ?? []).reduce((product, place) => product * (x[place] ?? 0), coefficient),
        0,
      ),
  };
}

/** All corners of a cube in `count` settings, the first changing fastest. */
export function allCorners(count: number): number[][] {
  return Array.from({ length: 2 ** count }, (_, corner) =>
    Array.from({ length: count }, (_, factor) => ((corner >> factor) & 1 ? 1 : -1)),
  );
}

/** A regular plan: a full factorial in the first settings, the others by products such as [0, 1, 2] for D = ABC. */
export function regularPlan(free: number, products: readonly (readonly number[])[] = []): number[][] {
  return allCorners(free).map((x) => [
    ...x,
    ...products.map((columns) => columns.reduce((sign, column) => sign * (x[column] ?? 1), 1)),
  ]);
}
