import type { Brief } from '../brief.ts';
import { isForbidden } from '../design/forbidden.ts';
import { lookAt } from './best-bet.ts';
import { findFailures } from './failures.ts';
import { modelResult, type ResultInput } from './result-model.ts';
import { usualSettings } from './usual-settings.ts';
import type { Outlook } from './verdict.ts';

/** What may be said of settings that somebody wonders about. */
export type Look =
  | { refused: 'outside'; place: number }
  | { refused: 'forbidden' | 'failed' }
  | {
      refused: null;
      /** One for each result, main first. */
      outlooks: Outlook[];
      /** The middle is off the line and these settings lie between the ends: the figure is rough. */
      isRough: boolean;
    };

/** Coded settings may stand this far beyond the ends, for a dial's steps are what they are. */
const SLACK = 1e-9;

/**
 * Looks at any settings inside the tested range by the same belief that chose the settings to try, so that both agree.
 *
 * @param results main result first
 * @returns a function of coded settings; it refuses what was never tried, what is forbidden, and what failed
 * @throws RangeError when there is no result
 */
export function lookAtSettings(
  brief: Brief,
  results: readonly ResultInput[],
): (coded: readonly number[]) => Look {
  const [main] = results;
  if (main === undefined) throw new RangeError('lookAtSettings: results must not be empty');
  const models = results.map((result) => modelResult(brief, result));
  const usual = usualSettings(brief);
  const failures = findFailures(main.input.runs);
  const bends = main.analysis.curvature?.ci ?? null;
  const isOffLine = bends !== null && (bends[0] > 0 || bends[1] < 0);
  return (coded) => {
    const place = coded.findIndex((value) => Math.abs(value) > 1 + SLACK);
    if (place >= 0) return { refused: 'outside', place };
    if (isForbidden(brief, [...coded])) return { refused: 'forbidden' };
    if (failures.excludes(coded)) return { refused: 'failed' };
    return {
      refused: null,
      outlooks: models.map((model, result) => lookAt({ model, result, usual, coded })),
      isRough: isOffLine && coded.some((value) => Math.abs(value) < 1 - SLACK),
    };
  };
}
