import type { LayoutRun } from '../../../src/lib/doe/design/error-plan.ts';
import { regularPlan } from '../../builders/random-process.ts';

/** A plan to be simulated, with what it is known for. */
export interface SimulatedPlan {
  name: string;
  rung: string;
  runs: (LayoutRun & { center: boolean })[];
  /** Numbers of contrasts that are active, one scenario each. */
  active: number[];
}

const sign = (run: LayoutRun, columns: number[]) =>
  columns.reduce((product, column) => product * (run.x[column] ?? 0), 1) > 0 ? 1 : 0;

const corners = (free: number, products: number[][] = []) =>
  regularPlan(free, products).map((x) => ({ x, center: false }));

const middles = (factors: number, count: number) =>
  Array.from({ length: count }, () => ({ x: new Array<number>(factors).fill(0), center: true }));

/** Blocks by the sign of a product of columns; middles in turn. */
function inBlocks<Run extends LayoutRun & { center: boolean }>(runs: Run[], columns: number[]): Run[] {
  let next = 0;
  return runs.map((run) => {
    return { ...run, block: run.center ? (next++ % 2) + 1 : sign(run, columns) + 1 };
  });
}

export const PLANS: SimulatedPlan[] = [
  {
    name: '2^3 + 3 middles',
    rung: 'replicates+high-order',
    runs: [...corners(3), ...middles(3, 3)],
    active: [0, 2, 6],
  },
  {
    name: '2^(4-1) + 4 middles',
    rung: 'replicates',
    runs: [...corners(3, [[0, 1, 2]]), ...middles(4, 4)],
    active: [0, 3, 6],
  },
  {
    name: '2^4 + 3 middles',
    rung: 'replicates+high-order',
    runs: [...corners(4), ...middles(4, 3)],
    active: [0, 4, 9],
  },
  {
    name: '2^(5-1) + 4 middles',
    rung: 'replicates',
    runs: [...corners(4, [[0, 1, 2, 3]]), ...middles(5, 4)],
    active: [0, 6, 14],
  },
  {
    name: '2^4 + 4 middles in two blocks',
    rung: 'replicates+high-order',
    runs: inBlocks([...corners(4), ...middles(4, 4)], [0, 1, 2, 3]),
    active: [0, 4],
  },
  {
    name: '2^4 + 3 middles, one corner missing',
    rung: 'replicates+high-order',
    runs: [...corners(4), ...middles(4, 3)].slice(1),
    active: [0, 4],
  },
  {
    name: '2^(4-1) + 3 middles',
    rung: 'pseudo+replicates',
    runs: [...corners(3, [[0, 1, 2]]), ...middles(4, 3)],
    active: [0, 1, 2, 3, 4],
  },
  {
    name: '2^(4-1) + 2 middles',
    rung: 'pseudo+replicates',
    runs: [...corners(3, [[0, 1, 2]]), ...middles(4, 2)],
    active: [0, 1, 2, 3, 4],
  },
  { name: '2^(4-1)', rung: 'pseudo', runs: corners(3, [[0, 1, 2]]), active: [0, 1, 2, 3, 4] },
  { name: '2^(5-1)', rung: 'pseudo', runs: corners(4, [[0, 1, 2, 3]]), active: [0, 1, 3, 6] },
];

export const WHOLE_PLOT_PLANS: SimulatedPlan[] = [
  {
    // Whole plots of two runs by the signs of A, BC and CD, four at each level of A.
    name: '2^4 in eight whole plots, A hard to change',
    rung: 'strata',
    runs: corners(4).map((run) => ({
      ...run,
      wholePlot: 4 * sign(run, [0]) + 2 * sign(run, [1, 2]) + sign(run, [2, 3]) + 1,
    })),
    active: [0, 3],
  },
  {
    // One whole plot at each level of A; two of middle runs, whose difference is all the error there is for A.
    name: '2^(4-1) + 6 middles in four whole plots, A hard to change',
    rung: 'strata',
    runs: [
      ...corners(3, [[0, 1, 2]]).map((run) => ({ ...run, wholePlot: sign(run, [0]) + 1 })),
      ...middles(4, 6).map((run, place) => ({ ...run, wholePlot: 3 + (place % 2) })),
    ],
    active: [0, 3],
  },
];
