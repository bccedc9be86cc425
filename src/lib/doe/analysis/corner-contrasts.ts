import { isRegularComplete } from '../design/regular-layout.ts';
import { createColumnSpace } from '../linear-algebra/column-space.ts';
import { dot } from '../linear-algebra/dot.ts';
import { indicatorColumns } from '../linear-algebra/indicators.ts';
import type { Layout } from './layout.ts';
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
 * Each is the sum of its column times the readings over half the number of corners, whatever else is in the model.
 */
export function estimateCornerContrasts(
  { layout, y }: { layout: Layout; y: readonly number[] },
  unit: 'block' | 'wholePlot' = 'block',
): CornerContrasts | null {
  const found = layout.remember(`corner contrasts in ${unit}`, () => listContrasts(layout, unit));
  if (found === null) return null;
  const { terms, columns, rows } = found;
  const offset = y[rows[0] ?? 0] ?? 0;
  const readings = rows.map((row) => (y[row] ?? 0) - offset);
  return {
    runs: rows.length,
    terms,
    effects: columns.map((column) => (2 * dot(column, readings)) / rows.length),
    placeOf(column) {
      const onCorners = rows.map((row) => column[row] ?? 0);
      return columns.findIndex((other) => Math.abs(dot(other, onCorners)) === rows.length);
    },
  };
}

function listContrasts({ letters, points }: Layout, unit: 'block' | 'wholePlot') {
  if (!isRegularComplete(points)) return null;
  const rows = points.flatMap((point, row) => (point.center ? [] : [row]));
  const corners = points.filter((point) => !point.center);
  const space = createColumnSpace(indicatorColumns(corners.map((point) => point[unit])));
  const terms: string[] = [];
  const columns: (readonly number[])[] = [];
  for (const term of listTerms(letters, letters.length)) {
    if (space.rank === corners.length) break;
    const column = termColumn(term, letters, corners);
    if (!space.add(column)) continue;
    terms.push(term);
    columns.push(column);
  }
  return { rows, terms, columns };
}
