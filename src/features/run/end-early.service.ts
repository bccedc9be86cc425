import { recordActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import type { Trial } from '../trial/trial.ts';
import { findStep, type TrialReader, takeStep } from '../trial/trial-reader.service.ts';
import { announceEnd } from './announce-end.service.ts';
import { settleProblems } from './problem.repository.ts';
import { listRuns } from './run.repository.ts';
import { isOpen } from './run.ts';
import { closeAsNotRun } from './skip-run.service.ts';

/**
 * Ends a trial with the runs there are, in the transaction at hand: open runs are skipped, the readings are in.
 * @throws AppError `forbidden`, `not-now`, `changed-meanwhile`
 */
export async function endEarly(
  scope: ShopScope,
  which: { trial: Trial; revision: number },
  reader: TrialReader,
): Promise<void> {
  const { trial, revision } = which;
  await takeStep(scope, trial, await findStep(scope, trial, 'judge', reader), revision);
  const runs = await listRuns(scope, trial.id);
  const open = runs.filter(isOpen);
  for (const run of open) await closeAsNotRun(scope, run);
  await settleProblems(scope, { trialId: trial.id }, reader.personId);
  await recordActivity(scope, {
    kind: 'trial.ended-early',
    subjectId: trial.id,
    trialId: trial.id,
    details: { skipped: open.map(({ number }) => number), runs: runs.length },
  });
  await announceEnd(scope, { trial, runs, how: 'early' });
}
