import { rolesMay } from '../../server/auth/permissions.ts';
import { now } from '../../server/clock.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { insertComment, listComments, listRoundIds, settleStoredComment } from './review.repository.ts';
import type { AddComment, PublicReview, SettleComment } from './review.schema.ts';
import { findReviewOf, isReviewer, showReview } from './show-review.service.ts';
import type { TrialReader } from './trial-reader.service.ts';

/** Reviewers and those who plan talk to each other; others read along. */
async function requireSpeaker(scope: ShopScope, reader: TrialReader): Promise<void> {
  if (rolesMay(reader.roles, 'trial.write') || (await isReviewer(scope, reader))) return;
  throw new AppError('forbidden', { detail: 'may not comment' });
}

/** Writes a remark at its place. The same id again writes nothing and answers what is there. */
export function addComment(
  scope: ShopScope,
  remark: AddComment & { reviewId: string },
  reader: TrialReader,
): Promise<PublicReview> {
  return inTransaction(scope, async (inner) => {
    const review = await findReviewOf(inner, remark.reviewId);
    await requireSpeaker(inner, reader);
    if (await insertComment(inner, { ...remark, writtenBy: reader.personId })) {
      await recordActivity(inner, {
        kind: 'review.commented',
        subjectId: remark.id,
        trialId: review.trial_id,
        details: { place: remark.place.slice(0, 80) },
      });
    } else {
      const known = await listComments(inner, review.trial_id, review.subject);
      if (!known.some(({ id }) => id === remark.id)) throw new AppError('not-found');
    }
    return showReview(inner, review, reader);
  });
}

/** Marks a remark as settled, or opens it again. @throws AppError `not-found` for a remark of another review */
export function settleComment(
  scope: ShopScope,
  wish: SettleComment & { reviewId: string },
  reader: TrialReader,
): Promise<PublicReview> {
  return inTransaction(scope, async (inner) => {
    const review = await findReviewOf(inner, wish.reviewId);
    await requireSpeaker(inner, reader);
    const which = { id: wish.id, reviewIds: await listRoundIds(inner, review) };
    if (!(await settleStoredComment(inner, which, wish.settled ? now() : null))) {
      throw new AppError('not-found', { detail: 'no such comment' });
    }
    const kind = wish.settled ? 'review.comment-settled' : 'review.comment-reopened';
    await recordActivity(inner, { kind, subjectId: wish.id, trialId: review.trial_id });
    return showReview(inner, review, reader);
  });
}
