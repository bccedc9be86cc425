import { listTerms } from '../analysis/terms.ts';
import { createColumnSpace } from '../linear-algebra/column-space.ts';
import { expandPoint, invertInformation } from './information.ts';
import type { Alias } from './proposal.ts';
import { type DefiningWord, describeWords, listAliases, multiply } from './regular-plan.ts';
import { lettersUpTo } from './words.ts';

interface AliasQuestion {
  /** Coded corner settings, in any order. */
  corners: readonly (readonly number[])[];
  /** Terms in the model. */
  terms: readonly string[];
  /** Terms left out of it. */
  others: readonly string[];
}

/**
 * The alias matrix (X1'X1)^-1 X1'X2, row by row, the mean left out (G.E.P. Box & K.B. Wilson, 1951, JRSS B 13, 1-45). Empty where the corners cannot
 * carry the model.
 */
export function traceAliases({ corners, terms, others }: AliasQuestion): Alias[] {
  const rows = corners.map((x) => expandPoint(x, terms));
  const inverse = invertInformation(rows);
  if (inverse === null) return [];
  const products = others.map((other) => {
    const column = corners.map((x) => expandPoint(x, [other])[1] ?? 0);
    return (rows[0] ?? []).map((_, j) =>
      rows.reduce((sum, row, run) => sum + (row[j] ?? 0) * (column[run] ?? 0), 0),
    );
  });
  return terms.flatMap((term, index) => {
    const line = inverse[index + 1] ?? [];
    const partners = others.flatMap((other, place) => {
      const coefficient = line.reduce((sum, value, j) => sum + value * (products[place]?.[j] ?? 0), 0);
      return Math.abs(coefficient) < 1e-9 ? [] : [{ term: other, coefficient }];
    });
    return partners.length === 0 ? [] : [{ term, with: partners }];
  });
}

/**
 * Aliases of any set of corners, for instance of a plan and the runs added to it: whole chains where the corners are a regular plan, whatever made
 * them; else the pairs that the estimable terms up to pairs carry with them.
 */
export function findAliases(corners: readonly (readonly number[])[]): Alias[] {
  const k = corners[0]?.length ?? 0;
  const words = findDefiningWords(corners);
  const distinct = new Set(corners.map((x) => x.join(' ')));
  const isRegular = distinct.size * (words.length + 1) === 2 ** k && corners.length % distinct.size === 0;
  if (isRegular && isEvenlyRepeated(corners, corners.length / distinct.size))
    return listAliases(describeWords(k, words));
  const space = createColumnSpace([corners.map(() => 1)]);
  const all = listTerms(lettersUpTo(k), 2);
  const terms = all.filter((term) => space.add(corners.map((x) => expandPoint(x, [term])[1] ?? 0)));
  return traceAliases({ corners, terms, others: all.filter((term) => !terms.includes(term)) });
}

/** Words that are the same, +1 or -1, in every corner. */
export function findDefiningWords(corners: readonly (readonly number[])[]): DefiningWord[] {
  const k = corners[0]?.length ?? 0;
  return Array.from({ length: 2 ** k - 1 }, (_, index) => index + 1).flatMap((word): DefiningWord[] => {
    const sign = multiply(word, corners[0] ?? []);
    if (Math.abs(sign) !== 1 || corners.some((x) => multiply(word, x) !== sign)) return [];
    return [{ word, sign: sign > 0 ? 1 : -1 }];
  });
}

function isEvenlyRepeated(corners: readonly (readonly number[])[], times: number): boolean {
  const counts = new Map<string, number>();
  for (const x of corners) counts.set(x.join(' '), (counts.get(x.join(' ')) ?? 0) + 1);
  return [...counts.values()].every((count) => count === times);
}
