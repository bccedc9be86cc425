import type { Brief } from '../brief.ts';
import { isForbidden } from './forbidden.ts';
import type { LayoutRow } from './proposal.ts';

/**
 * The middle points of a brief, each to be run equally often: all number settings halfway; one choice at both its values; two or more choices at
 * the usual combination (or, where a rule forbids that, at the nearest one allowed). Empty when every setting is a choice.
 */
export function listMiddles(brief: Brief): number[][] {
  const choices = brief.factors.flatMap((factor, index) => (factor.kind === 'choice' ? [index] : []));
  if (choices.length === brief.factors.length) return [];
  const middle: number[] = brief.factors.map((factor) =>
    factor.kind === 'choice' ? (factor.usual === 'high' ? 1 : -1) : 0,
  );
  const [only] = choices;
  if (choices.length === 1 && only !== undefined) {
    return [-1, 1].map((value) => middle.with(only, value)).filter((x) => !isForbidden(brief, x));
  }
  const nearest = listFlips(choices)
    .map((flipped) => middle.map((value, index) => (flipped.includes(index) ? -value : value)))
    .find((x) => !isForbidden(brief, x));
  return nearest === undefined ? [] : [nearest];
}

/** How middle runs are shared out: their number is always a multiple of this. */
export function middleStep(brief: Brief, blocks: number, withWholePlots: boolean): number {
  const points = listMiddles(brief).length;
  if (withWholePlots && hasHardNumber(brief)) return middlePlots(brief, blocks) * middlesPerPlotStep(brief);
  return points * blocks;
}

/**
 * Adds middle runs to the corners. With a hard number setting they form whole plots of their own, one a block and two in all at least, since a hard
 * dial at its middle is in neither of its corner positions; with hard choices only they join corner whole plots of the same choice.
 *
 * @throws RangeError when `count` is no multiple of `middleStep`.
 */
export function addMiddles(brief: Brief, corners: readonly LayoutRow[], count: number): LayoutRow[] {
  const blocks = Math.max(...corners.map((row) => row.block));
  const plots = Math.max(...corners.map((row) => row.wholePlot ?? 0));
  const step = middleStep(brief, blocks, plots > 0);
  if (count === 0) return [...corners];
  if (!(step > 0) || count % step !== 0)
    throw new RangeError(`addMiddles: count must be a multiple of ${step}, got ${count}`);
  const points = listMiddles(brief);
  const middles = Array.from({ length: count }, (_, index): LayoutRow => {
    const x = points[Math.floor(index / blocks) % points.length] ?? [];
    return { x, block: (index % blocks) + 1, center: true };
  });
  if (plots === 0) return [...corners, ...middles];
  const placed = hasHardNumber(brief)
    ? ownPlots({ brief, middles, blocks, after: plots })
    : sharedPlots({ brief, corners, middles });
  return [...corners, ...placed];
}

function hasHardNumber(brief: Brief): boolean {
  return brief.factors.some((factor) => factor.hardToChange && factor.kind === 'number');
}

/** Values of a choice that cannot share a whole plot because the choice itself is hard to change. */
function splitByHardChoice(brief: Brief): boolean {
  return (
    listMiddles(brief).length > 1 &&
    brief.factors.some((factor) => factor.hardToChange && factor.kind === 'choice')
  );
}

function middlePlots(brief: Brief, blocks: number): number {
  return splitByHardChoice(brief) ? 2 * blocks : Math.max(2, blocks);
}

/** An easy choice needs both its values in every middle whole plot. */
function middlesPerPlotStep(brief: Brief): number {
  return splitByHardChoice(brief) ? 1 : listMiddles(brief).length;
}

interface MiddlesInPlots {
  brief: Brief;
  middles: readonly LayoutRow[];
  blocks: number;
  /** Whole plots already numbered. */
  after: number;
}

function ownPlots({ brief, middles, blocks, after }: MiddlesInPlots): LayoutRow[] {
  const plots = middlePlots(brief, blocks);
  const points = listMiddles(brief);
  return middles.map((row, index) => {
    const plot = index % plots;
    const turn = splitByHardChoice(brief) ? Math.floor(plot / blocks) : Math.floor(index / plots);
    return {
      ...row,
      x: points[turn % points.length] ?? row.x,
      block: (plot % blocks) + 1,
      wholePlot: after + plot + 1,
    };
  });
}

function sharedPlots({
  brief,
  corners,
  middles,
}: Pick<MiddlesInPlots, 'brief' | 'middles'> & { corners: readonly LayoutRow[] }): LayoutRow[] {
  const hard = brief.factors.flatMap((factor, index) => (factor.hardToChange ? [index] : []));
  const turns = new Map<string, number>();
  return middles.map((row) => {
    const homes = [
      ...new Set(
        corners
          .filter(
            (corner) => corner.block === row.block && hard.every((index) => corner.x[index] === row.x[index]),
          )
          .map((corner) => corner.wholePlot),
      ),
    ];
    const key = `${row.block} ${row.x.join(' ')}`;
    const turn = turns.get(key) ?? 0;
    turns.set(key, turn + 1);
    // In twos, so that neighbours within a whole plot show its run-to-run spread.
    const home = homes[Math.floor(turn / 2) % homes.length];
    return home === undefined ? row : { ...row, wholePlot: home };
  });
}

/** All subsets, smallest first. */
function listFlips(indices: readonly number[]): number[][] {
  const subsets = Array.from({ length: 2 ** indices.length }, (_, bits) =>
    indices.filter((_, place) => (bits >> place) & 1),
  );
  return subsets.sort((first, second) => first.length - second.length);
}
