import type { Reply } from '../../lib/messages/index.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { logFigures, type Submission } from './keep-figures.service.ts';
import { isFarOff, type Range, widenRange } from './plausible.ts';
import { insertReading, listReadings } from './readings.repository.ts';
import { completeFigure, listResultItems } from './result-items.ts';
import { listRuns } from './run.repository.ts';
import type { Figure, Reading, Run } from './run.ts';
import { requirePlan } from './run-reader.service.ts';
import type { RunItem, RunningTrial } from './running-trial.ts';

/** The numbers of a reply as figures of the results they belong to. */
export function figuresOf(trial: RunningTrial, values: Reply['values'] = {}): Figure[] {
  return trial.items.flatMap(({ key, result, kind }): Figure[] => {
    const numbers = values[key] ?? [];
    if (kind === 'measured') {
      return numbers.map((value, place) => ({ result, part: place + 1, value, rejects: null, lot: null }));
    }
    const [count, lot = null] = numbers;
    if (count === undefined) return [];
    const isRejects = kind === 'rejects';
    return [{ result, part: 1, value: isRejects ? null : count, rejects: isRejects ? count : null, lot }];
  });
}

/** The values of figures, as a reply would have brought them. */
export function valuesOf(trial: RunningTrial, figures: readonly Figure[]): Record<string, number[]> {
  return Object.fromEntries(
    trial.items.flatMap(({ key, result }): [string, number[]][] => {
      const own = figures.filter((one) => one.result === result);
      const numbers = own.flatMap(({ value, rejects, lot }) =>
        value !== null ? [value] : [rejects ?? 0, ...(lot === null ? [] : [lot])],
      );
      return own.length === 0 ? [] : [[key, numbers]];
    }),
  );
}

/** What counts for a run now, result by result. */
export async function countingFigures(scope: ShopScope, runId: string): Promise<Reading[]> {
  const readings = await listReadings(scope, [runId]);
  return readings
    .filter(({ state }) => state === 'counts')
    .sort((one, other) => one.result - other.result || one.part - other.part);
}

/** The results of a run that still lack a number. */
export async function missingItems(scope: ShopScope, trial: RunningTrial, runId: string): Promise<RunItem[]> {
  const counting = await countingFigures(scope, runId);
  return trial.items.filter(
    ({ result, readings }) => counting.filter((one) => one.result === result).length < readings,
  );
}

/** What of each result would surprise nobody, the readings of this trial so far taken into account. */
export async function plausibleRanges(scope: ShopScope, trial: RunningTrial): Promise<Map<number, Range>> {
  const runIds = (await listRuns(scope, trial.id)).map(({ id }) => id);
  const counting = (await listReadings(scope, runIds)).filter(({ state }) => state === 'counts');
  const ranges = trial.items.flatMap(({ result, kind, range }): [number, Range][] => {
    if (kind !== 'measured') return [];
    const values = counting.flatMap((one) =>
      one.result === result && one.value !== null ? [one.value] : [],
    );
    const wide = widenRange(range, values);
    return wide === null ? [] : [[result, wide]];
  });
  return new Map(ranges);
}

/** Whether a figure lies far from anything plausible, so that it is asked back once before it counts. */
export async function looksOdd(
  scope: ShopScope,
  trial: RunningTrial,
  figures: readonly Figure[],
): Promise<boolean> {
  const ranges = await plausibleRanges(scope, trial);
  return figures.some(({ result, value }) => value !== null && isFarOff(value, ranges.get(result) ?? null));
}

/** Keeps figures beside a run without letting them count, until it is known what they are. @returns the first one's id */
export async function setApart(
  scope: ShopScope,
  run: Run,
  figures: readonly Figure[],
  from: Submission,
): Promise<string | null> {
  const items = listResultItems((await requirePlan(scope, run.trialId)).brief);
  const ids: string[] = [];
  for (const figure of figures) {
    ids.push(
      await insertReading(scope, run.id, { ...completeFigure(items, figure), ...from, state: 'asked back' }),
    );
  }
  await recordActivity(scope, {
    kind: 'reading.set-apart',
    subjectId: run.id,
    trialId: run.trialId,
    details: { run: run.number, source: from.source, before: [], after: logFigures(figures) },
  });
  return ids[0] ?? null;
}
