import { rolesMay } from '../../server/auth/permissions.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { readNames } from '../people/people.repository.ts';
import { findVerdict } from '../verdict/verdict.repository.ts';
import { readStoredAnswers } from './answers.repository.ts';
import { findLatestPlan } from './plan.repository.ts';
import { findReview, listComments, type StoredReview } from './review.repository.ts';
import type { PublicReview } from './review.schema.ts';
import { hashOfReviewed } from './reviewed-hash.service.ts';
import { listReviewers } from './trial-people.repository.ts';
import type { TrialReader } from './trial-reader.service.ts';

/** @throws AppError `not-found`, for another shop's review too */
export async function findReviewOf(scope: ShopScope, id: string): Promise<StoredReview> {
  const review = await findReview(scope, id);
  if (!review) throw new AppError('not-found', { detail: 'no such review' });
  return review;
}

/** The hash of what stands now under a review's subject. */
export async function presentHash(scope: ShopScope, review: StoredReview): Promise<string> {
  if (review.subject !== 'plan') return (await findVerdict(scope, review.trial_id))?.inputHash ?? '';
  const { answers } = await readStoredAnswers(scope, review.trial_id);
  return hashOfReviewed(answers, await findLatestPlan(scope, review.trial_id));
}

/** Whether a reader may agree to what others ask: an engineer, or somebody who answers for safety. */
export async function isReviewer(scope: ShopScope, reader: TrialReader): Promise<boolean> {
  return rolesMay(reader.roles, 'review.decide') || (await listReviewers(scope)).includes(reader.personId);
}

export async function showReview(
  scope: ShopScope,
  review: StoredReview,
  reader: TrialReader,
): Promise<PublicReview> {
  const comments = await listComments(scope, review.trial_id, review.subject);
  const people = [review.asked_by, review.decided_by, ...comments.map(({ written_by }) => written_by)];
  const names = await readNames(
    scope,
    people.filter((id) => id !== null),
  );
  const nameOf = (id: string) => names.get(id) ?? '';
  const stands = (await presentHash(scope, review)) === review.subject_hash;
  const isAsked = review.state === 'asked' && review.asked_by !== reader.personId;
  return {
    id: review.id,
    subject: review.subject,
    round: review.round,
    state: review.state,
    askedBy: nameOf(review.asked_by),
    askedAt: review.asked_at,
    decidedBy: review.decided_by === null ? null : nameOf(review.decided_by),
    decidedAt: review.decided_at,
    holds: stands && (review.state === 'approved' || review.state === 'unchecked'),
    mayDecide: isAsked && (await isReviewer(scope, reader)),
    comments: comments.map((comment) => ({
      id: comment.id,
      place: comment.place,
      words: comment.words,
      by: nameOf(comment.written_by),
      at: comment.created_at,
      settledAt: comment.settled_at,
    })),
  };
}
