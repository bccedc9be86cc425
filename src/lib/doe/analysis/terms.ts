import type { Letter } from '../brief.ts';

/** The letters of a term with repeats: 'AB' is A and B, 'AA' is A twice. */
export function lettersOf(term: string): Letter[] {
  return [...term];
}

/** Terms by number of letters, then alphabetically: A, B, C, AB, AC, BC, ABC. */
export function compareTerms(first: string, second: string): number {
  return first.length - second.length || (first < second ? -1 : first > second ? 1 : 0);
}

/** All products of up to `highestOrder` different letters, shortest first, then alphabetically. */
export function listTerms(letters: readonly Letter[], highestOrder: number): string[] {
  const terms: string[] = [];
  let previous: { term: string; next: number }[] = [{ term: '', next: 0 }];
  for (let order = 1; order <= Math.min(highestOrder, letters.length); order++) {
    previous = previous.flatMap(({ term, next }) =>
      letters.slice(next).map((letter, offset) => ({ term: term + letter, next: next + offset + 1 })),
    );
    terms.push(...previous.map(({ term }) => term));
  }
  return terms;
}

/** The terms together with every term that is contained in one of them, so that no interaction stands without its parents. */
export function completeHierarchy(terms: readonly string[]): string[] {
  const complete = new Set<string>();
  for (const term of terms) {
    for (const part of listTerms([...new Set(lettersOf(term))], term.length)) complete.add(part);
    complete.add(term);
  }
  return [...complete].sort(compareTerms);
}

/**
 * The value of a term at a point in coded units: the product of its letters' settings.
 *
 * @throws RangeError when the term names a letter that is not among the factors.
 */
export function termValue(term: string, letters: readonly Letter[], x: readonly number[]): number {
  return lettersOf(term).reduce((product, letter) => {
    const value = x[letters.indexOf(letter)];
    if (value === undefined)
      throw new RangeError(`termValue: term ${term} names an unknown factor ${letter}`);
    return product * value;
  }, 1);
}

// Every step of an analysis asks for the same columns of the same runs, which are never changed.
const columnsOfRuns = new WeakMap<object, Map<string, readonly number[]>>();

/** The values of a term over runs, one a run. */
export function termColumn(
  term: string,
  letters: readonly Letter[],
  runs: readonly { readonly x: readonly number[] }[],
): readonly number[] {
  let columns = columnsOfRuns.get(runs);
  if (columns === undefined) {
    columns = new Map();
    columnsOfRuns.set(runs, columns);
  }
  const known = columns.get(term);
  if (known !== undefined) return known;
  const last = term.slice(-1);
  const factor = letters.indexOf(last);
  if (factor < 0) throw new RangeError(`termColumn: term ${term} names an unknown factor ${last}`);
  const shorter = term.length > 1 ? termColumn(term.slice(0, -1), letters, runs) : null;
  const column = runs.map((run, row) => (run.x[factor] ?? 0) * (shorter?.[row] ?? 1));
  columns.set(term, column);
  return column;
}
