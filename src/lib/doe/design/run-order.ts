import type { UniformSource } from '../random/random-numbers.ts';
import { groupBy } from './group-by.ts';
import type { LayoutRow } from './proposal.ts';

const highestCorrelation = 0.7;
const mostDraws = 400;

/**
 * Draws an order of running: blocks one after the other, whole plots within them, runs within those, each shuffled; middle runs at the start, spread
 * and at the end of each block. An order in which some setting rises or falls with time (|correlation| above .7) is drawn again, from the same stream
 * of random numbers, so the seed alone gives the order; where none can be found, as with two whole plots, the flattest of many is kept.
 *
 * Returns indices of rows in the order of running.
 */
export function drawOrder(rows: readonly LayoutRow[], random: UniformSource): number[] {
  let flattest: number[] = [];
  let least = Number.POSITIVE_INFINITY;
  for (let draw = 0; draw < mostDraws; draw++) {
    const order = drawOnce(rows, random);
    const steepest = steepestCorrelation(order.map((index) => rows[index]?.x ?? []));
    if (steepest < least) [flattest, least] = [order, steepest];
    if (least <= highestCorrelation) break;
  }
  return flattest;
}

/** Largest absolute correlation of any setting with the place in the order; 0 where nothing varies. */
export function steepestCorrelation(ordered: readonly (readonly number[])[]): number {
  const runs = ordered.length;
  const middle = (runs - 1) / 2;
  let steepest = 0;
  for (let setting = 0; setting < (ordered[0]?.length ?? 0); setting++) {
    let sum = 0;
    let squares = 0;
    let product = 0;
    for (const [place, x] of ordered.entries()) {
      const value = x[setting] ?? 0;
      sum += value;
      squares += value * value;
      product += value * (place - middle);
    }
    const spread = (squares - (sum * sum) / runs) * ((runs * (runs * runs - 1)) / 12);
    if (spread > 0) steepest = Math.max(steepest, Math.abs(product) / Math.sqrt(spread));
  }
  return steepest;
}

interface Unit {
  indices: number[];
  isMiddle: boolean;
}

function drawOnce(rows: readonly LayoutRow[], random: UniformSource): number[] {
  const all = rows.map((row, index) => ({ ...row, index }));
  const blocks = shuffle(
    groupBy(all, (row) => row.block),
    random,
  );
  return blocks.flatMap((block) => {
    const plots = groupBy(block, (row) => row.wholePlot ?? -1 - row.index);
    const units = plots.map(
      (plot): Unit => ({
        indices: arrange(
          plot.map((row) => ({ indices: [row.index], isMiddle: row.center })),
          random,
        ),
        isMiddle: plot.every((row) => row.center),
      }),
    );
    return arrange(units, random);
  });
}

/** Middles first, spread evenly, and last; the others shuffled into the places left. */
function arrange(units: readonly Unit[], random: UniformSource): number[] {
  const middles = shuffle(
    units.filter((unit) => unit.isMiddle),
    random,
  );
  const others = shuffle(
    units.filter((unit) => !unit.isMiddle),
    random,
  );
  const last = units.length - 1;
  const places = new Set(
    middles.map((_, index) => Math.round((index * last) / Math.max(1, middles.length - 1))),
  );
  return units.flatMap(
    (_, place) => ((places.has(place) ? middles.shift() : others.shift()) ?? { indices: [] }).indices,
  );
}

/** R. Durstenfeld (1964), Communications of the ACM 7, 420: every order equally likely. */
export function shuffle<Item>(items: readonly Item[], random: UniformSource): Item[] {
  const shuffled = [...items];
  for (let last = shuffled.length - 1; last > 0; last--) {
    const other = Math.floor(random() * (last + 1));
    const [kept, moved] = [shuffled[last], shuffled[other]];
    if (kept === undefined || moved === undefined) continue;
    shuffled[last] = moved;
    shuffled[other] = kept;
  }
  return shuffled;
}
