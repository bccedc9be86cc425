import type { Alias } from '../design/proposal.ts';
import type { FactoredModel } from '../linear-algebra/least-squares.ts';

interface NamedColumn {
  term: string;
  column: readonly number[];
}

/**
 * What each estimate also contains: the alias matrix (X'X)^-1 X'Z of the terms left out, column by column.
 *
 * In regular plans a left-out column equals one of the model or its negative, or is orthogonal to all; those are matched by their values. Where
 * runs are missing or off target a left-out term spreads over several estimates; there only terms of up to three letters are listed.
 */
export function findAliases(question: {
  kept: readonly NamedColumn[];
  others: readonly NamedColumn[];
  columns: readonly (readonly number[])[];
  model: FactoredModel;
  firstTerm: number;
  weighted: boolean;
  /** Rows of corner runs: in a regular plan it is they that tie terms, whatever the middle runs of a choice add. */
  corners: readonly number[];
}): Alias[] {
  const { kept, others, columns, model, firstTerm, weighted, corners } = question;
  const signature = (column: readonly number[]) => signatureOf(corners.map((row) => column[row] ?? 0));
  const found = new Map<string, Alias['with']>(kept.map(({ term }) => [term, []]));
  const bySigns = new Map(kept.map(({ term, column }) => [signature(column).key, { term, column }]));
  for (const other of others) {
    const { key, sign } = signature(other.column);
    const same = bySigns.get(key);
    if (same) {
      found.get(same.term)?.push({ term: other.term, coefficient: sign * signature(same.column).sign });
      continue;
    }
    if (other.term.length > 3) continue;
    if (!weighted && columns.every((column) => isOrthogonal(column, other.column))) continue;
    const { coefficients } = model.fit(other.column);
    kept.forEach(({ term }, index) => {
      const coefficient = coefficients[firstTerm + index] ?? 0;
      if (Math.abs(coefficient) > 1e-9) found.get(term)?.push({ term: other.term, coefficient });
    });
  }
  return kept.map(({ term }) => ({ term, with: found.get(term) ?? [] }));
}

/** The values of a column after the sign of its first value is made positive: as bits where all are 1 or -1, else as text. */
function signatureOf(column: readonly number[]): { key: number | string; sign: 1 | -1 } {
  const sign = (column[0] ?? 1) < 0 ? -1 : 1;
  let bits = 0;
  for (const value of column) {
    if (value !== 1 && value !== -1) return { key: column.map((each) => sign * each + 0).join(' '), sign };
    bits = bits * 2 + (value === sign ? 1 : 0);
  }
  return { key: bits, sign };
}

function isOrthogonal(first: readonly number[], second: readonly number[]): boolean {
  let sum = 0;
  for (let row = 0; row < first.length; row++) sum += (first[row] ?? 0) * (second[row] ?? 0);
  return Math.abs(sum) < 1e-9 * first.length;
}
