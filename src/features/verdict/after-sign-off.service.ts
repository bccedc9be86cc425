import type { ShopScope } from '../../server/db/scope.ts';
import type { StoredReview } from '../trial/review.repository.ts';
import type { Trial } from '../trial/trial.ts';
import { announceAdoption } from './adopted.service.ts';
import { insertDecision } from './decision.repository.ts';
import { isSignOff, tellDecided } from './sign-off-messages.service.ts';
import { findVerdict } from './verdict.repository.ts';

/**
 * What follows once an engineer has agreed to a verdict or to new settings, or sent them back. Call it in the transaction
 * of that decision.
 */
export async function afterSignOff(
  scope: ShopScope,
  about: { trial: Trial; review: StoredReview; decision: 'approved' | 'sent back'; reviewerId: string },
): Promise<void> {
  const { trial, review, decision, reviewerId } = about;
  if (!isSignOff(review.subject)) throw new RangeError('afterSignOff: review.subject is a plan');
  await tellDecided(scope, { ...about, what: review.subject });
  if (review.subject !== 'adoption') return;
  const verdict = await findVerdict(scope, trial.id);
  if (!verdict) throw new RangeError('afterSignOff: the trial has no verdict');
  if (decision === 'approved') return announceAdoption(scope, { trial, verdict });
  await insertDecision(scope, {
    trialId: trial.id,
    verdictId: verdict.id,
    outcome: 'sent back',
    settings: [],
    note: '',
    decidedBy: reviewerId,
  });
}
