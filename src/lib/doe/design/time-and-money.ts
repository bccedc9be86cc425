import type { Brief } from '../brief.ts';
import { groupBy } from './group-by.ts';
import type { LayoutRow } from './proposal.ts';

/** Minutes and money a plan takes; absent where the brief does not say what one run takes. */
export interface TimeAndMoney {
  minutes?: number;
  cost?: number;
}

interface Change {
  settleMinutes: number;
  discardParts: number;
}

/** Of runs in a known order, from today's settings on: each run, the wait after each change of a setting and the parts thrown away then. */
export function countTimeAndMoney(brief: Brief, ordered: readonly (readonly number[])[]): TimeAndMoney {
  let total = noChange;
  let previous: readonly number[] = usualPoint(brief);
  for (const x of ordered) {
    total = add(total, changeBetween(brief, previous, x), 1);
    previous = x;
  }
  return convert(brief, ordered.length, total);
}

/**
 * Of a plan before it has an order: the average over all orders that respect its blocks and whole plots. The order that is drawn later may take a few
 * changes more or less.
 */
export function expectTimeAndMoney(brief: Brief, rows: readonly LayoutRow[]): TimeAndMoney {
  if (!brief.factors.some(({ settleMinutes = 0, discardParts = 0 }) => settleMinutes > 0 || discardParts > 0))
    return convert(brief, rows.length, noChange);
  const usual = usualPoint(brief);
  const first = average(rows.map((row) => changeBetween(brief, usual, row.x)));
  const blocks = groupBy(rows, (row) => row.block);
  let total = add(first, averageAcross(brief, blocks), blocks.length - 1);
  for (const block of blocks) {
    const plots = block.every((row) => row.wholePlot !== undefined)
      ? groupBy(block, (row) => row.wholePlot ?? 0)
      : block.map((row) => [row]);
    total = add(total, averageAcross(brief, plots), plots.length - 1);
    for (const plot of plots)
      total = add(
        total,
        averageAcross(
          brief,
          plot.map((row) => [row]),
        ),
        plot.length - 1,
      );
  }
  return convert(brief, rows.length, total);
}

const noChange: Change = { settleMinutes: 0, discardParts: 0 };

/** Settings that change together settle together, so the longest wait counts, and the parts made meanwhile are thrown away once. */
function changeBetween(brief: Brief, from: readonly number[], to: readonly number[]): Change {
  let settleMinutes = 0;
  let discardParts = 0;
  for (let index = 0; index < brief.factors.length; index++) {
    if (from[index] === to[index]) continue;
    settleMinutes = Math.max(settleMinutes, brief.factors[index]?.settleMinutes ?? 0);
    discardParts = Math.max(discardParts, brief.factors[index]?.discardParts ?? 0);
  }
  return { settleMinutes, discardParts };
}

/** Average change between runs of different groups; in plain sums, as it looks at every pair of runs of every plan. */
function averageAcross(brief: Brief, groups: readonly (readonly LayoutRow[])[]): Change {
  let settleMinutes = 0;
  let discardParts = 0;
  let pairs = 0;
  for (const [place, group] of groups.entries()) {
    for (const other of groups.slice(place + 1)) {
      for (const row of group) {
        for (const next of other) {
          const change = changeBetween(brief, row.x, next.x);
          settleMinutes += change.settleMinutes;
          discardParts += change.discardParts;
        }
      }
      pairs += group.length * other.length;
    }
  }
  return pairs === 0
    ? noChange
    : { settleMinutes: settleMinutes / pairs, discardParts: discardParts / pairs };
}

function average(changes: readonly Change[]): Change {
  return changes.reduce((sum, change) => add(sum, change, 1 / changes.length), noChange);
}

function add(sum: Change, change: Change, times: number): Change {
  return {
    settleMinutes: sum.settleMinutes + times * change.settleMinutes,
    discardParts: sum.discardParts + times * change.discardParts,
  };
}

function convert({ budget, response }: Brief, runs: number, changes: Change): TimeAndMoney {
  const result: TimeAndMoney = {};
  if (budget.minutesPerRun !== undefined)
    result.minutes = runs * budget.minutesPerRun + changes.settleMinutes;
  if (budget.costPerRun !== undefined) {
    const partsPerRun = response.lotSize ?? response.partsPerRun ?? 1;
    result.cost = budget.costPerRun * (runs + changes.discardParts / partsPerRun);
  }
  return result;
}

function usualPoint(brief: Brief): number[] {
  return brief.factors.map((factor) =>
    factor.kind === 'choice'
      ? factor.usual === 'high'
        ? 1
        : -1
      : (2 * factor.usual - factor.low - factor.high) / (factor.high - factor.low),
  );
}
