import { listTerms } from '../analysis/terms.ts';
import { createColumnSpace } from '../linear-algebra/column-space.ts';
import { indicatorColumns } from '../linear-algebra/indicators.ts';
import { expandPoint } from './information.ts';
import type { LayoutRow } from './proposal.ts';
import { lettersUpTo } from './words.ts';

/** Main effects and pairs that a layout estimates by themselves: tied to no other main effect or pair, to no block and not to the bend. */
export function listSeparateTerms(rows: readonly LayoutRow[]): string[] {
  const terms = listTerms(lettersUpTo(rows[0]?.x.length ?? 0), 2);
  const columns = terms.map((term) => rows.map((row) => expandPoint(row.x, [term])[1] ?? 0));
  const always = [...indicatorColumns(rows.map((row) => row.block)), rows.map((row) => (row.center ? 1 : 0))];
  return terms.filter((_, index) => {
    const others = createColumnSpace([...always, ...columns.filter((__, place) => place !== index)]);
    return !others.spans(columns[index] ?? []);
  });
}
