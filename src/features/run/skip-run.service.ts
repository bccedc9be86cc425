import { now } from '../../server/clock.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import type { Trial } from '../trial/trial.ts';
import { findStep, findTrialOf, type TrialReader, takeStep } from '../trial/trial-reader.service.ts';
import { closeIfLastRun } from './close-trial.service.ts';
import { logFigures, standing } from './keep-figures.service.ts';
import { cancelUnsentPrompts } from './prompts.repository.ts';
import { listReadings, setReadingStates } from './readings.repository.ts';
import type { Run } from './run.ts';
import { findRunOf, isBeingRun, requireBeingRun, requireRunStep, takeRunStep } from './run-reader.service.ts';

/** Closes one run as not run, without looking at whether it was the last. What it read so far no longer counts. */
export async function closeAsNotRun(scope: ShopScope, run: Run, revision?: number): Promise<void> {
  const step = requireRunStep(run, 'skip');
  const stood = standing(await listReadings(scope, [run.id]));
  await setReadingStates(
    scope,
    stood.map(({ id }) => id),
    'not used',
  );
  await takeRunStep(scope, run, step, { revision, end: 'notRun', closedAt: now(), remindAt: null });
  await cancelUnsentPrompts(scope, { trialId: run.trialId, runId: run.id });
  await recordActivity(scope, {
    kind: 'run.skipped',
    subjectId: run.id,
    trialId: run.trialId,
    details: { run: run.number, state: run.state, before: logFigures(stood), after: [] },
  });
}

/**
 * Leaves a run out; no reason is needed.
 * @throws AppError `not-found`, `not-now`, `changed-meanwhile`
 */
export function skipRun(
  scope: ShopScope,
  which: { runId: string; revision?: number | undefined },
): Promise<void> {
  return inTransaction(scope, async (inner) => {
    const run = await findRunOf(inner, which.runId);
    await requireBeingRun(inner, run);
    await closeAsNotRun(inner, run, which.revision);
    await closeIfLastRun(inner, run.trialId);
  });
}

/** Takes a trial whose readings are in back to running, for a run that is to be made after all. */
export async function runOn(
  scope: ShopScope,
  trial: Trial,
  event: 'repeat a run' | 'put back a run',
  reader: TrialReader,
): Promise<void> {
  if (isBeingRun(trial)) return;
  await takeStep(scope, trial, await findStep(scope, trial, event, reader));
}

/**
 * Puts a skipped run back: it waits for its turn again.
 * @throws AppError `not-found`, `not-now`, `changed-meanwhile`
 */
export function putBackRun(
  scope: ShopScope,
  which: { runId: string; revision?: number | undefined },
  reader: TrialReader,
): Promise<void> {
  return inTransaction(scope, async (inner) => {
    const run = await findRunOf(inner, which.runId);
    const step = requireRunStep(run, 'put back');
    await runOn(inner, await findTrialOf(inner, run.trialId), 'put back a run', reader);
    const fresh = { end: null, closedAt: null, askedAt: null, madeAt: null, measuredAt: null };
    await takeRunStep(inner, run, step, { revision: which.revision, ...fresh, stretchId: null });
    await recordActivity(inner, {
      kind: 'run.put-back',
      subjectId: run.id,
      trialId: run.trialId,
      details: { run: run.number },
    });
  });
}
