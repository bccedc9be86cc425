import { z } from 'zod';
import { now } from '../../server/clock.ts';
import { moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { reviewStates, reviewSubjects } from './review.schema.ts';

const reviewRow = z.object({
  id: z.string(),
  trial_id: z.string(),
  subject: z.enum(reviewSubjects),
  subject_hash: z.string(),
  round: z.number(),
  state: z.enum(reviewStates),
  asked_by: z.string(),
  asked_at: moment,
  decided_by: z.string().nullable(),
  decided_at: moment.nullable(),
});
export type StoredReview = z.output<typeof reviewRow>;
type Subject = StoredReview['subject'];

const commentRow = z.object({
  id: z.string(),
  review_id: z.string(),
  place: z.string(),
  words: z.string(),
  written_by: z.string(),
  created_at: moment,
  settled_at: moment.nullable(),
});
export type StoredComment = z.output<typeof commentRow>;

export async function findReview(scope: ShopScope, id: string): Promise<StoredReview | null> {
  const row: unknown = await scope.db('reviews').where({ shop_id: scope.shopId, id }).first();
  return row ? reviewRow.parse(row) : null;
}

/** The newest round of a subject, if it was ever asked about. */
export async function findLatestReview(
  scope: ShopScope,
  trialId: string,
  subject: Subject,
): Promise<StoredReview | null> {
  const row: unknown = await scope
    .db('reviews')
    .where({ shop_id: scope.shopId, trial_id: trialId, subject })
    .orderBy('round', 'desc')
    .first();
  return row ? reviewRow.parse(row) : null;
}

export async function insertReview(
  scope: ShopScope,
  review: Pick<StoredReview, 'id' | 'trial_id' | 'subject' | 'subject_hash' | 'round' | 'state' | 'asked_by'>,
): Promise<void> {
  await scope.db('reviews').insert({ ...review, shop_id: scope.shopId, asked_at: now() });
}

/** Ends a review that is still asked for. @returns whether it was */
export async function decideAskedReview(
  scope: ShopScope,
  id: string,
  decision: { state: 'approved' | 'sent back' | 'taken back'; decidedBy: string },
): Promise<boolean> {
  const changed = await scope
    .db('reviews')
    .where({ shop_id: scope.shopId, id, state: 'asked' })
    .update({ state: decision.state, decided_by: decision.decidedBy, decided_at: now() });
  return changed > 0;
}

/**
 * What these subjects rest on has changed: agreements no longer hold, and what is asked is asked about something old.
 * @returns how many reviews that touched
 */
export async function reopenReviews(
  scope: ShopScope,
  trialId: string,
  subjects: readonly Subject[],
): Promise<number> {
  const own = () =>
    scope
      .db('reviews')
      .where({ shop_id: scope.shopId, trial_id: trialId })
      .whereIn('subject', [...subjects]);
  const reopened = await own().where({ state: 'approved' }).update({ state: 'reopened' });
  return reopened + (await own().where({ state: 'asked' }).update({ state: 'taken back' }));
}

/** Remarks of all rounds of a subject, oldest first. */
export async function listComments(
  scope: ShopScope,
  trialId: string,
  subject: Subject,
): Promise<StoredComment[]> {
  const rounds = scope
    .db('reviews')
    .where({ shop_id: scope.shopId, trial_id: trialId, subject })
    .select('id');
  const rows = await scope
    .db('review_comments')
    .where({ shop_id: scope.shopId })
    .whereIn('review_id', rounds)
    .orderBy(['created_at', 'id']);
  return z.array(commentRow).parse(rows);
}

/** @returns false when the id is taken */
export async function insertComment(
  scope: ShopScope,
  comment: { id: string; reviewId: string; place: string; words: string; writtenBy: string },
): Promise<boolean> {
  const added = await scope
    .db('review_comments')
    .insert({
      id: comment.id,
      shop_id: scope.shopId,
      review_id: comment.reviewId,
      place: comment.place,
      words: comment.words,
      written_by: comment.writtenBy,
      created_at: now(),
    })
    .onConflict('id')
    .ignore()
    .returning('id');
  return added.length > 0;
}

/** @returns whether the trial's reviews of this subject have such a remark */
export async function settleStoredComment(
  scope: ShopScope,
  which: { id: string; reviewIds: readonly string[] },
  settledAt: number | null,
): Promise<boolean> {
  const changed = await scope
    .db('review_comments')
    .where({ shop_id: scope.shopId, id: which.id })
    .whereIn('review_id', [...which.reviewIds])
    .update({ settled_at: settledAt });
  return changed > 0;
}

export async function listRoundIds(scope: ShopScope, review: StoredReview): Promise<string[]> {
  const ids: unknown[] = await scope
    .db('reviews')
    .where({ shop_id: scope.shopId, trial_id: review.trial_id, subject: review.subject })
    .pluck('id');
  return ids.map(String);
}
