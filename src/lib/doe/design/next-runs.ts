import type { Brief, Letter } from '../brief.ts';
import { isForbidden } from './forbidden.ts';
import { groupBy } from './group-by.ts';
import { addMiddles, listMiddles, middleStep } from './middle-runs.ts';
import type { LayoutRow, PlannedRun } from './proposal.ts';
import { letterAt } from './words.ts';

/** What was run before, as rows of one layout. */
export function rowsOf(done: readonly PlannedRun[]): LayoutRow[] {
  return done.map(({ coded, block, wholePlot, center }) => ({
    x: coded,
    block,
    ...(wholePlot === undefined ? {} : { wholePlot }),
    center,
  }));
}

/** The different corners of a layout, in their order. */
export function listCorners(rows: readonly LayoutRow[]): number[][] {
  return groupBy(
    rows.filter((row) => !row.center && row.x.every((value) => Math.abs(value) === 1)),
    (row) => row.x.join(' '),
  ).flatMap(([row]) => (row === undefined ? [] : [row.x]));
}

/** The same corners with the signs of some settings turned round; those that a rule forbids are left out. */
export function foldCorners(
  brief: Brief,
  corners: readonly number[][],
  letters: readonly Letter[],
): number[][] {
  return corners
    .map((x) => x.map((value, index) => (letters.includes(letterAt(index)) ? -value : value)))
    .filter((x) => !isForbidden(brief, x));
}

/** Two runs for each number setting, at its low and its high with all others at the middle: on the faces of the tested range, never outside. */
export function listAxialPoints(brief: Brief): number[][] {
  const [middle] = listMiddles(brief);
  if (middle === undefined) return [];
  return brief.factors
    .flatMap((factor, index) =>
      factor.kind === 'number' ? [middle.with(index, -1), middle.with(index, 1)] : [],
    )
    .filter((x) => !isForbidden(brief, x));
}

/** Points as a new session: one block, in whole plots by their hard settings if the trial has them, with `middles` middle runs of its own. */
export function makeSession(
  brief: Brief,
  points: readonly number[][],
  middles: number,
  inPlots: boolean,
): LayoutRow[] {
  const hard = brief.factors.flatMap((factor, index) => (factor.hardToChange ? [index] : []));
  const plots = new Map<string, number>();
  const rows = points.map((x): LayoutRow => {
    if (!inPlots) return { x, block: 1, center: false };
    const key = hard.map((index) => x[index]).join(' ');
    if (!plots.has(key)) plots.set(key, plots.size + 1);
    return { x, block: 1, wholePlot: plots.get(key) ?? 0, center: false };
  });
  return addMiddles(brief, rows, middles);
}

/** Numbers of middle runs that a session may have, two at least so that it starts and ends with one; 0 alone where there is no middle. */
export function listSessionMiddles(brief: Brief, points: number, inPlots: boolean): number[] {
  if (listMiddles(brief).length === 0) return [0];
  const step = middleStep(brief, 1, inPlots);
  const counts = Array.from({ length: Math.ceil(8 / step) }, (_, index) => (index + 1) * step);
  return counts.filter((count) => count >= 2 && count <= Math.max(2 * step, points + 1));
}
