import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { findTrialOf, type TrialReader } from '../trial/trial-reader.service.ts';
import { findRun, touchBoard } from './run.repository.ts';
import { insertAddedRun } from './run-order.repository.ts';
import { findRunOf, requireRunStep, runChangedMeanwhile } from './run-reader.service.ts';
import { runOn } from './skip-run.service.ts';

/**
 * Has a run made once more: a new run with the same settings takes its turn after all others. The first one and its
 * reading stay.
 * @param which.submission the new run's id, so that sending it twice makes one
 * @throws AppError `not-found`, `not-now`, `changed-meanwhile`, `already-there`
 */
export function repeatRun(
  scope: ShopScope,
  which: { runId: string; revision?: number | undefined; submission: string },
  reader: TrialReader,
): Promise<void> {
  return inTransaction(scope, async (inner) => {
    const run = await findRunOf(inner, which.runId);
    const known = await findRun(inner, which.submission);
    if (known?.repeatsRunId === run.id) return;
    requireRunStep(run, 'repeat');
    if (which.revision !== undefined && which.revision !== run.revision) {
      throw await runChangedMeanwhile(inner, run.id);
    }
    await runOn(inner, await findTrialOf(inner, run.trialId), 'repeat a run', reader);
    const repeat = { ...run, id: which.submission, repeatsRunId: run.id, warmUp: false, place: null };
    if (!(await insertAddedRun(inner, repeat))) throw new AppError('already-there');
    await touchBoard(inner, run.trialId);
    await recordActivity(inner, {
      kind: 'run.repeated',
      subjectId: run.id,
      trialId: run.trialId,
      details: { run: run.number, repeat: which.submission },
    });
  });
}
