import type { Brief } from '../brief.ts';
import { createUniformSource } from '../random/random-numbers.ts';
import { setDials } from './dial.ts';
import type { LayoutRow, PlannedRun, Proposal } from './proposal.ts';
import { drawOrder } from './run-order.ts';

/**
 * The runs of a proposal in the order of running, drawn from a seed: the same seed always gives the same order.
 *
 * Blocks and whole plots are numbered as they come.
 */
export function layOutRuns(brief: Brief, proposal: Pick<Proposal, 'layout'>, seed: number): PlannedRun[] {
  return layOutRows(brief, proposal.layout, seed);
}

/** Runs that are added to others: orders, standard places, blocks and whole plots go on after those of `after`. */
export function layOutAddedRuns(
  brief: Brief,
  added: readonly LayoutRow[],
  seed: number,
  after: readonly PlannedRun[],
): PlannedRun[] {
  const last = (numberOf: (run: PlannedRun) => number) => Math.max(0, ...after.map(numberOf));
  const [orders, standards, blocks, plots] = [
    last((run) => run.order),
    last((run) => run.standard),
    last((run) => run.block),
    last((run) => run.wholePlot ?? 0),
  ];
  return layOutRows(brief, added, seed).map((run) => ({
    ...run,
    order: run.order + orders,
    standard: run.standard + standards,
    block: run.block + blocks,
    ...(run.wholePlot === undefined ? {} : { wholePlot: run.wholePlot + plots }),
  }));
}

/** A short name of planned settings: '+-0' is high, low, middle. Runs with the same name are repeats of each other. */
export function nameGroup(x: readonly number[]): string {
  return x.map((value) => (value > 0 ? '+' : value < 0 ? '-' : '0')).join('');
}

function layOutRows(brief: Brief, rows: readonly LayoutRow[], seed: number): PlannedRun[] {
  const order = drawOrder(rows, createUniformSource(seed));
  const blocks = new Map<number, number>();
  const plots = new Map<number, number>();
  const points = new Map<string, ReturnType<typeof setDials>>();
  return order.flatMap((index, place) => {
    const row = rows[index];
    if (row === undefined) return [];
    const group = nameGroup(row.x);
    const { coded, actual } = points.get(group) ?? setDials(brief, row.x);
    points.set(group, { coded, actual });
    return {
      order: place + 1,
      standard: index + 1,
      block: numberAsTheyCome(blocks, row.block),
      ...(row.wholePlot === undefined ? {} : { wholePlot: numberAsTheyCome(plots, row.wholePlot) }),
      group,
      center: row.center,
      coded: [...coded],
      actual: [...actual],
    };
  });
}

function numberAsTheyCome(numbers: Map<number, number>, label: number): number {
  const number = numbers.get(label) ?? numbers.size + 1;
  numbers.set(label, number);
  return number;
}
