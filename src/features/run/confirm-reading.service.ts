import { now } from '../../server/clock.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { closeIfLastRun } from './close-trial.service.ts';
import { logFigures } from './keep-figures.service.ts';
import { listReadings, setReadingStates } from './readings.repository.ts';
import { listResultItems, missingParts } from './result-items.ts';
import {
  findRunOf,
  requireBeingRun,
  requirePlan,
  requireRunStep,
  takeRunStep,
} from './run-reader.service.ts';

/**
 * Settles a reading that was asked back: it is right and counts, or it is not and is asked for again. A right one of
 * which parts are missing leaves the run open.
 * @throws AppError `not-found`, `not-now`, `changed-meanwhile`
 */
export function confirmReading(
  scope: ShopScope,
  which: { runId: string; revision?: number | undefined; isRight: boolean },
): Promise<void> {
  return inTransaction(scope, async (inner) => {
    const run = await findRunOf(inner, which.runId);
    await requireBeingRun(inner, run);
    const readings = await listReadings(inner, [run.id]);
    const askedBack = readings.filter(({ state }) => state === 'asked back');
    const ids = askedBack.map(({ id }) => id);
    await setReadingStates(inner, ids, which.isRight ? 'counts' : 'not used');
    const items = listResultItems((await requirePlan(inner, run.trialId)).brief);
    const counted = readings.filter(({ state }) => state === 'counts');
    const isAll = missingParts(items, [...counted, ...askedBack]).length === 0;
    // A right reading with parts still to come goes back to being made: the rest is typed as usual.
    const isDone = which.isRight && isAll;
    const step = requireRunStep(run, isDone ? 'confirm' : which.isRight ? 'record part' : 'deny');
    const at = now();
    const closing = isDone ? { end: 'measured' as const, closedAt: at, remindAt: null } : {};
    await takeRunStep(inner, run, step, { revision: which.revision, ...closing });
    await recordActivity(inner, {
      kind: which.isRight ? 'reading.confirmed' : 'reading.denied',
      subjectId: run.id,
      trialId: run.trialId,
      details: {
        run: run.number,
        asked: logFigures(askedBack),
        before: logFigures(counted),
        after: logFigures(which.isRight ? [...counted, ...askedBack] : counted),
      },
    });
    if (isDone) await closeIfLastRun(inner, run.trialId);
  });
}
