import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { askNextRun } from './ask-next.service.ts';
import { findRunOf, requireRunStep, runChangedMeanwhile } from './run-reader.service.ts';
import { readRunningTrial } from './running-trial.service.ts';

/**
 * Sends the next run out now, whatever its pace or start time; the phone must be free and its person at work as ever.
 * @throws AppError `not-now` where it cannot go out, `changed-meanwhile` where it is not the next one any more
 */
export function sendNow(
  scope: ShopScope,
  which: { runId: string; revision?: number | undefined },
): Promise<void> {
  return inTransaction(scope, async (inner) => {
    const run = await findRunOf(inner, which.runId);
    requireRunStep(run, 'send now');
    const trial = await readRunningTrial(inner, run.trialId);
    const asked = await askNextRun(inner, trial, { isWished: true });
    if (asked === undefined) throw new AppError('not-now', { detail: 'the next run cannot go out' });
    if (asked.run.id !== run.id) throw await runChangedMeanwhile(inner, run.id);
  });
}
