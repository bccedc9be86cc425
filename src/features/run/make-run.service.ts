import { now } from '../../server/clock.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { askForResults } from './ask-for-results.service.ts';
import { cancelUnsentPrompts } from './prompts.repository.ts';
import { findRunOf, requireBeingRun, requireRunStep, takeRunStep } from './run-reader.service.ts';
import { readRunningTrial } from './running-trial.service.ts';
import { findStretch } from './stretch.repository.ts';

/**
 * A run is made; its result is still to come.
 * @throws AppError `not-found`, `not-now`, `changed-meanwhile`
 */
export function makeRun(scope: ShopScope, which: { runId: string; revision?: number }): Promise<void> {
  return inTransaction(scope, async (inner) => {
    const run = await findRunOf(inner, which.runId);
    await requireBeingRun(inner, run);
    const step = requireRunStep(run, 'make');
    await takeRunStep(inner, run, step, {
      revision: which.revision,
      madeAt: now(),
      remindAt: null,
      stretchId: await findStretch(inner, run.trialId),
    });
    await cancelUnsentPrompts(inner, { trialId: run.trialId, runId: run.id });
    const trial = await readRunningTrial(inner, run.trialId);
    if (trial.resultsLater) await askForResults(inner, trial, await findRunOf(inner, run.id));
    await recordActivity(inner, {
      kind: 'run.made',
      subjectId: run.id,
      trialId: run.trialId,
      details: { run: run.number },
    });
  });
}
