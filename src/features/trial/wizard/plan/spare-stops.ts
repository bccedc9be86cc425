import { parseFigure } from '../../finished/typed-figure.ts';

/** Where the slider for hours stops; after the last one there is no limit. */
export const hourStops = [1, 2, 3, 4, 5, 6, 7, 8, 10, 12, 16, 20, 24, 32, 40] as const;

export const runRange = { least: 4, most: 64 } as const;

const steps = [5, 10, 15, 20, 30, 40, 50, 75, 100, 150, 200, 300, 500] as const;
/** So many runs are in the middle of what people plan. */
const middlingRuns = 15;

/** Round amounts around what some runs cost, whatever the money is worth. */
export function moneyStops(costPerRun: number): number[] {
  const power = Math.floor(Math.log10(costPerRun * middlingRuns)) - 1;
  // Written out and read back, so that no amount ends in a row of nines.
  return steps.map((step) => Number((step * 10 ** power).toPrecision(2)));
}

/** The place of an amount among the stops: the first that covers it; after the last, no limit. */
export function placeOf(amount: number | null, stops: readonly number[]): number {
  if (amount === null) return stops.length;
  const place = stops.findIndex((stop) => stop >= amount);
  return place < 0 ? stops.length : place;
}

/** What was typed as a limit; null where there is none. */
export function limitOf(typed: string | undefined, isOpen: boolean | undefined): number | null {
  return isOpen ? null : parseFigure(typed ?? '');
}
