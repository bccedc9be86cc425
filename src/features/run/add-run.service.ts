import { rolesMay } from '../../server/auth/permissions.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import type { Trial } from '../trial/trial.ts';
import type { TrialReader } from '../trial/trial-reader.service.ts';
import type { AddedRunKind } from './added-run.ts';
import { listRuns, touchBoard } from './run.repository.ts';
import type { Run } from './run.ts';
import { insertAddedRun } from './run-order.repository.ts';
import { isBeingRun } from './run-reader.service.ts';
import { readRunningTrial } from './running-trial.service.ts';

/**
 * Puts a run before the next one: to warm a cold machine up, at the usual settings, which does not count; or a middle run
 * after a long stop, which counts as one more of those in the plan.
 * @param which.id the new run's id, so that sending it twice makes one
 * @throws AppError `forbidden`, `not-now` where no run waits or the plan has no middle run, `already-there`
 */
export async function addRunAs(
  scope: ShopScope,
  which: { trial: Trial; id: string; kind: AddedRunKind },
  reader: TrialReader,
): Promise<void> {
  const { trial, id, kind } = which;
  if (!rolesMay(reader.roles, 'run.record')) throw new AppError('forbidden', { detail: 'lacks run.record' });
  const runs = await listRuns(scope, trial.id);
  if (runs.some((run) => run.id === id)) return;
  const next = runs.find(({ state }) => state === 'waiting');
  if (!isBeingRun(trial) || !next) throw new AppError('not-now', { detail: 'no run waits' });
  const added = kind === 'warm-up' ? await warmUpOf(scope, trial, next) : middleOf(runs, next);
  if (!(await insertAddedRun(scope, { ...added, id, place: next.place }))) {
    throw new AppError('already-there');
  }
  await touchBoard(scope, trial.id);
  const details = { kind };
  await recordActivity(scope, { kind: 'run.added', subjectId: id, trialId: trial.id, details });
}

async function warmUpOf(scope: ShopScope, trial: Trial, next: Run) {
  const { settings } = await readRunningTrial(scope, trial.id);
  const planned = settings.map(({ usual }) => usual);
  return { ...next, planned, group: 'warm-up', center: false, warmUp: true, repeatsRunId: null };
}

function middleOf(runs: readonly Run[], next: Run) {
  const middle = runs.find(({ center, warmUp }) => center && !warmUp);
  if (!middle) throw new AppError('not-now', { detail: 'the plan has no middle run' });
  const { block, personId, measurerId } = next;
  return { ...middle, block, personId, measurerId, warmUp: false, repeatsRunId: middle.id };
}
