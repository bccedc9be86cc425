import { averageOver, isConstantWithin, middleColumns } from '../design/error-plan.ts';
import { createColumnSpace } from '../linear-algebra/column-space.ts';
import { indicatorColumns } from '../linear-algebra/indicators.ts';
import type { Layout } from './layout.ts';
import { unitContrasts } from './model-layout.ts';
import { termColumn } from './terms.ts';

/** A sum of squares that is nothing but error. */
export interface Spread {
  df: number;
  ss: number;
}

export interface SpreadQuestion {
  layout: Layout;
  /** Readings on the scale of the analysis, one a point. */
  y: readonly number[];
  /** Terms whose effects are no error. */
  terms: readonly string[];
}

type Unit = 'block' | 'wholePlot';

/** Spread between runs at identical settings, after blocks or whole plots (which are taken to shift all their runs alike). */
export function pureErrorOf(
  { layout, y }: Pick<SpreadQuestion, 'layout' | 'y'>,
  unit: Unit = 'block',
): Spread {
  const { points } = layout;
  const around = aroundColumns(layout, `pure error in ${unit}`, () => [
    ...unitContrasts(points.map((point) => point[unit])),
    ...indicatorColumns(points.map((point) => point.x.join(' '))),
  ]);
  return around(y);
}

/** What blocks or whole plots, sets of middle runs and the terms leave: pure error plus the free columns. */
export function leftoverSpread({ layout, y, terms }: SpreadQuestion, unit: Unit = 'block'): Spread {
  const around = aroundColumns(layout, `leftover in ${unit} of ${terms.join(' ')}`, () => [
    ...unitContrasts(layout.points.map((point) => point[unit])),
    ...middleColumns(layout.points),
    ...terms.map((term) => termColumn(term, layout.letters, layout.points)),
  ]);
  return around(y);
}

/** Residual sum of squares around a constant and the named columns, which may depend on each other. */
export function aroundColumns(
  layout: Layout,
  name: string,
  columns: () => readonly (readonly number[])[],
): (y: readonly number[]) => Spread {
  return layout.remember(`around ${name}`, () =>
    residualAround(layout.points.length, layout.weights, columns()),
  );
}

/** The same between whole plots, from their averages; a mean square of it is in the variance of one run. */
export function leftoverBetweenPlots({ layout, y, terms }: SpreadQuestion): Spread {
  const { points, letters } = layout;
  const plots = indicatorColumns(points.map((point) => point.wholePlot));
  const averaged = (column: readonly number[]) => plots.map((plot) => averageOver(plot, column));
  const around = layout.remember(`between plots of ${terms.join(' ')}`, () => {
    const columns = [
      ...unitContrasts(points.map((point) => point.block)),
      ...middleColumns(points),
      ...terms.map((term) => termColumn(term, letters, points)),
    ].filter((column) => isConstantWithin(plots, column));
    return residualAround(plots.length, plotWeights(points, plots), columns.map(averaged));
  });
  return around(averaged(y));
}

/**
 * Runs in each whole plot; one made of middle runs counts as big as those of the corners. Where it is smaller its average carries more of the spread
 * within plots than theirs do, so the error comes out a little too big rather than too small.
 */
function plotWeights(
  points: readonly { center: boolean }[],
  plots: readonly (readonly number[])[],
): number[] {
  const sizes = plots.map((plot) => plot.reduce((sum, member) => sum + member, 0));
  const ofCorners = plots.map((plot) => points.some((point, row) => plot[row] === 1 && !point.center));
  const usual = Math.max(...sizes.filter((_, index) => ofCorners[index]), 1);
  return sizes.map((size, index) => (ofCorners[index] ? size : usual));
}

function residualAround(
  rows: number,
  weights: readonly number[] | undefined,
  columns: readonly (readonly number[])[],
): (y: readonly number[]) => Spread {
  const roots = weights?.map(Math.sqrt);
  const weighted = (column: readonly number[]) =>
    roots ? column.map((value, row) => value * (roots[row] ?? 1)) : column;
  const space = createColumnSpace([weighted(new Array<number>(rows).fill(1))]);
  for (const column of columns) space.add(weighted(column));
  const df = rows - space.rank;
  return (y) => {
    const offset = y[0] ?? 0;
    return { df, ss: df === 0 ? 0 : space.squaredDistance(weighted(y.map((value) => value - offset))) };
  };
}
