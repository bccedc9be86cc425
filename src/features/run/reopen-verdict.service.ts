import { recordActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { wakeWorker } from '../../server/wake.ts';
import { reopenReviews } from '../trial/review.repository.ts';
import { updateTrial } from '../trial/trial.repository.ts';
import type { Trial } from '../trial/trial.ts';
import { changedMeanwhile } from '../trial/trial-reader.service.ts';
import { transitionsOf } from '../trial/trial-states.ts';
import { isBeingRun } from './run-reader.service.ts';

/**
 * What a run read, or how it was set, changed after its trial's readings were in: the next verdict is due, and nobody's
 * agreement holds any more. While the trial is being run there is nothing to reopen.
 * @throws AppError `not-now` for a trial that is closed: it is opened again first
 */
export async function reopenVerdict(scope: ShopScope, trial: Trial): Promise<void> {
  if (isBeingRun(trial)) return;
  const [step] = transitionsOf(trial.state, 'reading corrected');
  if (!step) throw new AppError('not-now', { detail: `a correction in ${trial.state}` });
  const moved = await updateTrial(
    scope,
    { id: trial.id, from: [step.from], revision: trial.revision },
    { state: 'readings in' },
  );
  if (!moved) throw await changedMeanwhile(scope, trial.id);
  const reopened = await reopenReviews(scope, trial.id, ['verdict', 'adoption']);
  await recordActivity(scope, {
    kind: 'trial.verdict-reopened',
    subjectId: trial.id,
    trialId: trial.id,
    details: { from: step.from, reviews: reopened },
  });
  wakeWorker();
}
