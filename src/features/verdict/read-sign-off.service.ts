import { rolesMay } from '../../server/auth/permissions.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { findLatestReview, type StoredReview } from '../trial/review.repository.ts';
import type { PublicReview } from '../trial/review.schema.ts';
import { showReview } from '../trial/show-review.service.ts';
import type { Trial } from '../trial/trial.ts';
import type { TrialReader } from '../trial/trial-reader.service.ts';
import type { TrialState } from '../trial/trial-states.ts';
import type { SignOffSubject } from './sign-off-messages.service.ts';

/** What an engineer was asked last in each state; settings come after the verdict they rest on. */
const subjectsIn: Partial<Record<TrialState, readonly SignOffSubject[]>> = {
  'readings in': ['verdict'],
  'verdict review': ['verdict'],
  deciding: ['adoption', 'verdict'],
  'adoption review': ['adoption'],
  closed: ['adoption', 'verdict'],
};

/** An engineer's word on a verdict, or on settings to be used: asked for, given, sent back or no longer holding. */
export interface SignOffView {
  review: PublicReview;
  /** Whether this reader may agree or send back. */
  mayDecide: boolean;
  /** Whether this reader may ask about the verdict once more as it stands. */
  mayAskAgain: boolean;
}

async function newestOf(
  scope: ShopScope,
  trialId: string,
  subjects: readonly SignOffSubject[],
): Promise<StoredReview | null> {
  const found = await Promise.all(subjects.map((subject) => findLatestReview(scope, trialId, subject)));
  return (
    found
      .filter((review) => review !== null)
      .sort((one, other) => other.asked_at - one.asked_at || other.id.localeCompare(one.id))[0] ?? null
  );
}

/** @returns null where nobody was asked */
export async function readSignOff(
  scope: ShopScope,
  trial: Pick<Trial, 'id' | 'state'>,
  reader: TrialReader,
): Promise<SignOffView | null> {
  const newest = await newestOf(scope, trial.id, subjectsIn[trial.state] ?? []);
  if (!newest) return null;
  const review = await showReview(scope, newest, reader);
  const isReview = trial.state === 'verdict review' || trial.state === 'adoption review';
  return {
    review,
    mayDecide: isReview && review.mayDecide && rolesMay(reader.roles, 'review.decide'),
    mayAskAgain:
      trial.state === 'readings in' && review.state === 'sent back' && rolesMay(reader.roles, 'trial.write'),
  };
}
