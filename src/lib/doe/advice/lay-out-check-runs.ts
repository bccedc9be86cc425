import type { Brief } from '../brief.ts';
import { setDials } from '../design/dial.ts';
import type { PlannedRun } from '../design/proposal.ts';
import { createUniformSource } from '../random/random-numbers.ts';
import { usualSettings, usualValues } from './usual-settings.ts';

/** What a check run is made at: the settings to try, or the usual ones. Kept as the run's `group`. */
export const checkGroups = { best: 'best', usual: 'usual' } as const;

/**
 * Check runs in the order of running: pairs of one run at the best settings and one at usual, which of the two comes first drawn anew for each pair
 * from the seed. So a shift of the day falls on both alike, and a slow change over the day nearly so.
 *
 * @param best coded settings to try, as `bestBet` gives them
 * @throws RangeError when `pairs` is not a whole number from 1 or `best` has not one value a setting
 */
export function layOutCheckRuns(
  brief: Brief,
  best: readonly number[],
  pairs: number,
  seed: number,
): PlannedRun[] {
  if (!Number.isInteger(pairs) || pairs < 1)
    throw new RangeError(`layOutCheckRuns: pairs must be a whole number from 1, got ${pairs}`);
  if (best.length !== brief.factors.length)
    throw new RangeError(
      `layOutCheckRuns: best must have ${brief.factors.length} values, got ${best.length}`,
    );
  const draw = createUniformSource(seed);
  const points = { best: setDials(brief, best), usual: usualOnDial(brief) };
  const groups = Array.from({ length: pairs }, () =>
    draw() < 0.5
      ? ([checkGroups.best, checkGroups.usual] as const)
      : ([checkGroups.usual, checkGroups.best] as const),
  ).flat();
  return groups.map((group, place) => ({
    order: place + 1,
    standard: place + 1,
    block: 1,
    group,
    center: false,
    ...points[group],
  }));
}

/** Usual settings as they are on the dials today, whatever the dial's steps. */
function usualOnDial(brief: Brief): { coded: number[]; actual: (number | string)[] } {
  return {
    coded: usualSettings(brief),
    actual: usualValues(brief),
  };
}
