import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { readStoredAnswers } from '../trial/answers.repository.ts';
import { findTrialOf } from '../trial/trial-reader.service.ts';
import { requirePlan } from './run-reader.service.ts';
import { describeRunningTrial, type RunningTrial } from './running-trial.ts';

/**
 * A trial as those who run it need it.
 * @throws AppError `not-found` for one of another shop or none; `not-now` for one that was never started
 */
export async function readRunningTrial(scope: ShopScope, trialId: string): Promise<RunningTrial> {
  const trial = await findTrialOf(scope, trialId);
  if (['draft', 'plan review', 'ready'].includes(trial.state)) throw new AppError('not-now');
  const { answers } = await readStoredAnswers(scope, trialId);
  const { settingIds } = await requirePlan(scope, trialId);
  return describeRunningTrial(trial, answers, settingIds);
}
