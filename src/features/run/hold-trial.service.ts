import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { updateTrial } from '../trial/trial.repository.ts';
import type { Trial } from '../trial/trial.ts';
import { changedMeanwhile, findStep, findTrialOf, type TrialReader } from '../trial/trial-reader.service.ts';
import { transitionsOf } from '../trial/trial-states.ts';
import { announceHold } from './announce-hold.service.ts';
import { cancelUnsentPrompts } from './prompts.repository.ts';
import { listRuns, updateRun } from './run.repository.ts';
import { requireRunStep } from './run-reader.service.ts';

/**
 * Stops a trial for safety, all in one transaction: held, what asks for runs cancelled, those on shift told first. Whoever
 * asks must be somebody of the trial; stopped already is no error, and a page that is behind is none either.
 * @throws AppError `not-now` where nothing is being run
 */
export function holdTrial(scope: ShopScope, trialId: string): Promise<void> {
  return inTransaction(scope, async (inner) => {
    const trial = await findTrialOf(inner, trialId);
    if (trial.state === 'held') return;
    const [step] = transitionsOf(trial.state, 'hold');
    if (!step) throw new AppError('not-now', { detail: `hold in ${trial.state}` });
    if (!(await updateTrial(inner, { id: trialId, from: [step.from] }, { state: 'held' }))) {
      throw await changedMeanwhile(inner, trialId);
    }
    const cancelled = await cancelUnsentPrompts(inner, { trialId });
    const runs = await listRuns(inner, trialId);
    const inHand = runs.filter(({ state }) => state === 'asked');
    for (const run of inHand) {
      const back = requireRunStep(run, 'take back');
      const change = { state: back.to, askedAt: null, remindAt: null };
      await updateRun(inner, { id: run.id, from: [back.from] }, change);
    }
    const unreached = await announceHold(inner, { trial, runs, stop: trial.revision });
    await recordActivity(inner, {
      kind: 'trial.held',
      subjectId: trialId,
      trialId,
      details: { from: step.from, takenBack: inHand.map(({ number }) => number), cancelled, unreached },
    });
  });
}

/** The same by somebody who is signed in. @throws AppError `forbidden`, `not-now` */
export async function holdTrialAs(
  scope: ShopScope,
  which: { trial: Trial },
  reader: TrialReader,
): Promise<void> {
  // Held already: two who press at the same moment both have stopped it.
  if (which.trial.state !== 'held') await findStep(scope, which.trial, 'hold', reader);
  await holdTrial(scope, which.trial.id);
}
