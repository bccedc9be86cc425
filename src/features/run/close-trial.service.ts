import { recordActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { wakeWorker } from '../../server/wake.ts';
import { updateTrial } from '../trial/trial.repository.ts';
import { findTrialOf } from '../trial/trial-reader.service.ts';
import { announceEnd } from './announce-end.service.ts';
import { listRuns } from './run.repository.ts';
import { isOpen } from './run.ts';

/**
 * Ends the making where the last open run of a running trial has just been closed, in the transaction at hand: its
 * readings are in, and the verdict is made next. A paused or held trial waits until it goes on.
 * @returns whether the readings are in
 */
export async function closeIfLastRun(scope: ShopScope, trialId: string): Promise<boolean> {
  const trial = await findTrialOf(scope, trialId);
  const runs = await listRuns(scope, trialId);
  if (trial.state !== 'running' || runs.some(isOpen)) return false;
  const moved = await updateTrial(scope, { id: trialId, from: ['running'] }, { state: 'readings in' });
  if (!moved) return false;
  const done = runs.filter(({ state }) => state === 'done').length;
  await recordActivity(scope, {
    kind: 'trial.readings-in',
    subjectId: trialId,
    trialId,
    details: { done, skipped: runs.length - done },
  });
  await announceEnd(scope, { trial, runs, how: 'all in' });
  // Whoever wakes before the commit waits for the connection, and so sees what was committed.
  wakeWorker();
  return true;
}
