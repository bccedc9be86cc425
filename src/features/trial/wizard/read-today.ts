import { checkGauge, describePast, spreadOfExtremes, suggestWorthHaving } from '../../../lib/doe/index.ts';
import type { Answers } from '../answers.schema.ts';
import { parseFigure, parseFigures } from '../finished/typed-figure.ts';
import type { TodaySoFar } from './wizard-context.ts';

function figureOf(typed: string | undefined): number | null {
  return parseFigure(typed ?? '');
}

/** What the figures of today say, from whatever of them is there. */
export function readToday({ usual = {}, gauge }: Answers): TodaySoFar {
  const past = describePast(parseFigures(usual.past ?? '') ?? []);
  const [lowest, highest] = [figureOf(usual.lowest), figureOf(usual.highest)];
  const hasRange = lowest !== null && highest !== null && lowest < highest;
  const spread = past ?? (hasRange ? spreadOfExtremes(lowest, highest) : null);
  const sd = usual.notSure ? null : (spread?.sd ?? null);
  const pairs = (gauge?.pairs ?? []).flatMap(({ first, second }): [number, number][] => {
    const [one, two] = [figureOf(first), figureOf(second)];
    return one === null || two === null ? [] : [[one, two]];
  });
  return {
    swing: sd === null ? null : 2 * sd,
    suggestions: sd === null ? [] : suggestWorthHaving(sd),
    mean: past?.mean ?? null,
    gauge: checkGauge(pairs, sd),
  };
}
