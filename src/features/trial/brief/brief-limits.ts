import type { Brief, NoiseGuess } from '../../../lib/doe/index.ts';
import { describePast, spreadOfExtremes } from '../../../lib/doe/index.ts';
import { splitThings } from '../finished/around.schema.ts';
import { planDefaults } from '../finished/start.schema.ts';
import type { FinishedOf } from '../finished.schema.ts';
import { present, toCoreFigure } from './brief-result.ts';
import { usualMinutesPerRun } from './minutes-per-run.ts';

export function toBudget(spare: FinishedOf<'spare'>, measuring: FinishedOf<'measuring'>): Brief['budget'] {
  const { runs, hours, hoursOpen, money, moneyOpen, minutesPerRun, costPerRun } = spare;
  return {
    maxRuns: runs ?? planDefaults.maxRuns,
    minutesPerRun: minutesPerRun ?? usualMinutesPerRun(measuring),
    ...present({
      minutes: hoursOpen || hours === null ? null : hours * 60,
      money: moneyOpen ? null : money,
      costPerRun,
    }),
  };
}

/** The one thing that the runs are split by, if there is one. */
export function toBlocks(around: FinishedOf<'around'>): Brief['blocks'] | null {
  const thing = splitThings.find((name) => around[name].way === 'split');
  if (!thing) return null;
  const { count, runsEach, words } = around[thing];
  return { name: words === '' ? thing : words, kind: thing, count: count ?? 2, ...present({ runsEach }) };
}

/** What today's ups and downs say of the noise; null: nobody is sure. Past numbers outweigh the lowest and the highest. */
export function toNoise(usual: FinishedOf<'usual'>, result: FinishedOf<'result'>): NoiseGuess | null {
  if (usual.notSure) return null;
  const { past, lowest, highest } = usual;
  const seen =
    describePast(past) ?? (lowest === null || highest === null ? null : spreadOfExtremes(lowest, highest));
  if (seen === null) return null;
  const isCounted = result.kind === 'rejects' || result.kind === 'flaws';
  return { sd: toCoreFigure(seen.sd, result), of: isCounted ? 'runMean' : 'part', df: seen.df };
}

/** Today's figure: as it was said, else the mean of the past numbers; null: nobody is sure. */
export function usualFigure({ usual, past }: FinishedOf<'usual'>): number | null {
  return usual ?? describePast(past)?.mean ?? null;
}
