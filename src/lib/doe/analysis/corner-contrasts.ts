import type { Letter } from '../brief.ts';
import { isRegularComplete } from '../design/regular-layout.ts';
import { createColumnSpace } from '../linear-algebra/column-space.ts';
import type { MeasuredRun } from './measured-runs.ts';
import { listTerms, termColumn } from './terms.ts';

/** The single-degree contrasts of the corner runs of a regular complete plan. */
export interface CornerContrasts {
  /** Corner runs. */
  runs: number;
  terms: string[];
  /** Change from low to high. */
  effects: number[];
  /** Place of the contrast that is this column or its negative; -1: none. */
  placeOf(column: readonly number[]): number;
}

/**
 * All orthogonal contrasts of the corners that blocks (or whole plots) do not touch, or null when the plan is not regular and complete.
 *
 * Each is half the sum of its column times the readings over half the number of corners, whatever else is in the model.
 */
export function estimateCornerContrasts(
  letters: readonly Letter[],
  runs: readonly MeasuredRun[],
  unitOf: (run: MeasuredRun) => number | undefined = (run) => run.block,
): CornerContrasts | null {
  if (!isRegularComplete(runs)) return null;
  const corners = runs.filter((run) => !run.center);
  const units = [...new Set(corners.map(unitOf))].map((unit) =>
    corners.map((run) => (unitOf(run) === unit ? 1 : 0)),
  );
  const space = createColumnSpace(units);
  const terms: string[] = [];
  const columns: (readonly number[])[] = [];
  for (const term of listTerms(letters, letters.length)) {
    if (space.rank === corners.length) break;
    const column = termColumn(term, letters, corners);
    if (!space.add(column)) continue;
    terms.push(term);
    columns.push(column);
  }
  const productWith = (column: readonly number[], values: readonly number[]) =>
    column.reduce((sum, sign, row) => sum + sign * (values[row] ?? 0), 0);
  const offset = corners[0]?.y ?? 0;
  const readings = corners.map((run) => run.y - offset);
  const isCorner = runs.map((run) => !run.center);
  return {
    runs: corners.length,
    terms,
    effects: columns.map((column) => (2 * productWith(column, readings)) / corners.length),
    placeOf(column) {
      const onCorners = column.filter((_, row) => isCorner[row]);
      return columns.findIndex((other) => Math.abs(productWith(other, onCorners)) === corners.length);
    },
  };
}
