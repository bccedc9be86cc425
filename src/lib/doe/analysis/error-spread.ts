import type { Letter } from '../brief.ts';
import { averageOver, isConstantWithin, middleColumns } from '../design/error-plan.ts';
import { createColumnSpace } from '../linear-algebra/column-space.ts';
import { indicatorColumns } from '../linear-algebra/indicators.ts';
import type { MeasuredRun } from './measured-runs.ts';
import { unitContrasts } from './model-layout.ts';
import { termColumn } from './terms.ts';

/** A sum of squares that is nothing but error. */
export interface Spread {
  df: number;
  ss: number;
}

export interface SpreadQuestion {
  letters: readonly Letter[];
  runs: readonly MeasuredRun[];
  weights?: readonly number[];
  /** Terms whose effects are no error. */
  terms: readonly string[];
}

/** Spread between runs at identical settings, after blocks or whole plots (which are taken to shift all their runs alike). */
export function pureErrorOf(
  { runs, weights }: SpreadQuestion,
  unit: 'block' | 'wholePlot' = 'block',
): Spread {
  const combinations = indicatorColumns(runs.map((run) => run.x.join(' ')));
  const columns = [...unitContrasts(runs.map((run) => run[unit])), ...combinations];
  return residualSpread({ y: runs.map((run) => run.y), weights, columns });
}

/** What blocks or whole plots, sets of middle runs and the terms leave: pure error plus the free columns. */
export function leftoverSpread(question: SpreadQuestion, unit: 'block' | 'wholePlot' = 'block'): Spread {
  const { letters, runs, weights, terms } = question;
  const columns = [
    ...unitContrasts(runs.map((run) => run[unit])),
    ...middleColumns(runs),
    ...terms.map((term) => termColumn(term, letters, runs)),
  ];
  return residualSpread({ y: runs.map((run) => run.y), weights, columns });
}

/** The same between whole plots, from their averages; a mean square of it is in the variance of one run. */
export function leftoverBetweenPlots({ letters, runs, terms }: SpreadQuestion): Spread {
  const plots = indicatorColumns(runs.map((run) => run.wholePlot));
  const averaged = (column: readonly number[]) => plots.map((plot) => averageOver(plot, column));
  const columns = [
    ...unitContrasts(runs.map((run) => run.block)),
    ...middleColumns(runs),
    ...terms.map((term) => termColumn(term, letters, runs)),
  ].filter((column) => isConstantWithin(plots, column));
  return residualSpread({
    y: averaged(runs.map((run) => run.y)),
    weights: plotWeights(runs, plots),
    columns: columns.map(averaged),
  });
}

/**
 * Runs in each whole plot; one made of middle runs counts as big as those of the corners. Where it is smaller its average carries more of the spread
 * within plots than theirs do, so the error comes out a little too big rather than too small.
 */
function plotWeights(runs: readonly MeasuredRun[], plots: readonly (readonly number[])[]): number[] {
  const sizes = plots.map((plot) => plot.reduce((sum, member) => sum + member, 0));
  const ofCorners = plots.map((plot) => runs.some((run, row) => plot[row] === 1 && !run.center));
  const cornerSizes = sizes.filter((_, index) => ofCorners[index]);
  const usual = Math.max(...cornerSizes, 1);
  return sizes.map((size, index) => (ofCorners[index] ? size : usual));
}

/** Residual sum of squares around a constant and the columns, which may depend on each other. */
export function residualSpread(question: {
  y: readonly number[];
  weights?: readonly number[] | undefined;
  columns: readonly (readonly number[])[];
}): Spread {
  const { y, weights, columns } = question;
  const roots = weights?.map(Math.sqrt);
  const weighted = (column: readonly number[]) =>
    roots ? column.map((value, row) => value * (roots[row] ?? 1)) : column;
  const space = createColumnSpace([weighted(y.map(() => 1))]);
  for (const column of columns) space.add(weighted(column));
  const df = y.length - space.rank;
  const offset = y[0] ?? 0;
  return { df, ss: df === 0 ? 0 : space.squaredDistance(weighted(y.map((value) => value - offset))) };
}
