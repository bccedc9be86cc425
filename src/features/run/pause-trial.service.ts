import { recordActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import type { Trial } from '../trial/trial.ts';
import { findStep, type TrialReader, takeStep } from '../trial/trial-reader.service.ts';
import { cancelUnsentPrompts } from './prompts.repository.ts';

/**
 * Pauses a trial, in the transaction at hand: nobody is asked or reminded until it goes on. What comes in is kept.
 * @throws AppError `forbidden`, `not-now`, `changed-meanwhile`
 */
export async function pauseTrial(
  scope: ShopScope,
  which: { trial: Trial; revision: number },
  reader: TrialReader,
): Promise<void> {
  const { trial, revision } = which;
  await takeStep(scope, trial, await findStep(scope, trial, 'pause', reader), revision);
  await cancelUnsentPrompts(scope, { trialId: trial.id });
  await recordActivity(scope, { kind: 'trial.paused', subjectId: trial.id, trialId: trial.id });
}
