import { listNumbers } from './number-list.ts';
import { type ReadNumber, waysToRead } from './number-ways.ts';
import type { ExpectedItem, Reply } from './reply.ts';

export type ReadValues =
  | { values: Record<string, number[]>; run?: number }
  | { ask: NonNullable<Reply['ask']> }
  /** `nothing`: no number stands there. `words`: it says more than numbers, so nothing is taken from it. */
  | { nothing: true }
  | { words: true };

type Plausible = Readonly<Record<string, readonly [number, number]>>;
interface Fitting {
  values: Record<string, number[]>;
  run?: number;
  isPlausible: boolean;
  /** All measured values lie in a known range. */
  isConfirmed: boolean;
}

/**
 * Reads the numbers of a text for the results that are asked for, in their order: all of them, or the first ones whole.
 * @param options.leadingRun whether the first number may be a run's (`FIX 4 41.5`)
 */
export function readValues(
  text: string,
  items: readonly ExpectedItem[],
  options: { plausible?: Plausible | undefined; leadingRun?: boolean } = {},
): ReadValues {
  const names = items.flatMap(({ key, names: known = [] }) => [key, ...known]);
  const { numbers, isUnclear, hasOtherWords, hasPercent } = listNumbers(text, names);
  if (numbers.length === 0) return { nothing: true };
  if (hasOtherWords) return { words: true };
  const isShareOfCount = hasPercent && items.some(({ kind }) => kind !== 'measured');
  if (isUnclear || isShareOfCount) return { ask: 'whichNumber' };
  const ways = waysToRead(numbers);
  if (ways.length === 0) return { ask: 'whichNumber' };

  const { plausible = {}, leadingRun = false } = options;
  const fittingWays = (points: 'decimal' | 'thousands') =>
    ways
      .filter((way) => way.points === points)
      .flatMap(({ read, isBold }) =>
        [
          ...fitItems(read, items, plausible),
          ...(leadingRun ? fitBehindRun(read, items, plausible) : []),
        ].filter(({ isConfirmed }) => isConfirmed || !isBold),
      );
  const usual = fittingWays('decimal');
  const other = fittingWays('thousands');
  const isOtherWay = !usual.some((way) => way.isPlausible) && other.some((way) => way.isPlausible);
  const fitting = usual.length === 0 || isOtherWay ? other : usual;
  if (fitting.length === 0) {
    const counted = ways.some(({ read }) => fitItems(read, items, plausible, 'any').length > 0);
    const isTied = numbers.some(({ tie }) => tie !== null);
    return { ask: counted || isTied ? 'whichNumber' : 'howMany' };
  }
  const plausibleOnes = fitting.filter((way) => way.isPlausible);
  const isRowOfCommas = numbers.some(({ typed }) => typed.split(',').length > 2);
  const candidates = fitting.length > 1 || isRowOfCommas ? plausibleOnes : fitting;
  const [only, second] = candidates;
  if (!only || second) return { ask: 'whichNumber' };
  return only.run === undefined ? { values: only.values } : { values: only.values, run: only.run };
}

function fitBehindRun(
  [first, ...rest]: readonly ReadNumber[],
  items: readonly ExpectedItem[],
  plausible: Plausible,
): Fitting[] {
  if (!first || first.tie !== null || !Number.isInteger(first.value) || first.value < 1) return [];
  return fitItems(rest, items, plausible).map((way) => ({ ...way, run: first.value }));
}

/** Deals the numbers out to the items. @returns one entry, or none where they do not come out even */
function fitItems(
  numbers: readonly ReadNumber[],
  items: readonly ExpectedItem[],
  plausible: Plausible,
  check: 'sound' | 'any' = 'sound',
): Fitting[] {
  const values: Record<string, number[]> = {};
  const left = [...numbers];
  let isPlausible = true;
  let isConfirmed = true;
  for (const item of items) {
    if (left.length === 0) break;
    const taken = item.kind === 'rejects' ? takeCount(left) : takeMany(left, item.readings);
    if (taken === null || (check === 'sound' && !isSound(taken, item))) return [];
    values[item.key] = taken;
    isPlausible &&= withinReason(taken, item, plausible[item.key]);
    isConfirmed &&= isPlausible && (item.kind !== 'measured' || plausible[item.key] !== undefined);
  }
  return left.length > 0 || Object.keys(values).length === 0 ? [] : [{ values, isPlausible, isConfirmed }];
}

function takeCount(left: ReadNumber[]): number[] | null {
  const count = left.shift();
  if (!count) return null;
  if (count.tie === null) return [count.value];
  const lot = left.shift();
  return lot && lot.tie === null ? [count.value, lot.value] : null;
}

/** Numbers parted by slashes are a list only where nobody could mean a fraction or a date. */
function takeMany(left: ReadNumber[], readings: number): number[] | null {
  if (left.length < readings) return null;
  const taken = left.splice(0, readings);
  const tied = taken.filter(({ tie }) => tie !== null);
  if (tied.length === 0) return taken.map(({ value }) => value);
  const isListOfSlashes =
    taken.at(-1)?.tie === null &&
    taken.slice(0, -1).every(({ tie }) => tie === 'slash') &&
    taken.some(({ value }) => !Number.isInteger(value));
  return isListOfSlashes ? taken.map(({ value }) => value) : null;
}

function isSound(taken: readonly number[], { kind, lotSize }: ExpectedItem): boolean {
  if (kind === 'measured') return true;
  if (!taken.every((value) => Number.isInteger(value) && value >= 0)) return false;
  const [count = 0, lot = lotSize ?? Number.POSITIVE_INFINITY] = taken;
  return kind === 'flaws' || count <= lot;
}

function withinReason(
  taken: readonly number[],
  { kind }: ExpectedItem,
  range: readonly [number, number] | undefined,
): boolean {
  const figures = kind === 'rejects' ? taken.slice(0, 1) : taken;
  return !range || figures.every((value) => value >= range[0] && value <= range[1]);
}
