import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { newId } from '../../server/ids.ts';
import { afterSignOff } from '../verdict/after-sign-off.service.ts';
import { readStoredAnswers } from './answers.repository.ts';
import { findLatestPlan } from './plan.repository.ts';
import { requireComplete } from './readiness.service.ts';
import { decideAskedReview, findLatestReview, insertReview, type StoredReview } from './review.repository.ts';
import type { PublicReview } from './review.schema.ts';
import { tellAsker, tellReviewers } from './review-messages.service.ts';
import { hashOfReviewed } from './reviewed-hash.service.ts';
import { findReviewOf, presentHash, showReview } from './show-review.service.ts';
import type { Trial } from './trial.ts';
import { listReviewers } from './trial-people.repository.ts';
import { findStep, findTrialOf, type TrialReader, takeStep } from './trial-reader.service.ts';

/**
 * Writes down that a plan is asked about, or that it goes ahead without a second person, in the transaction at hand.
 * @returns the review's id
 */
export async function openReview(
  scope: ShopScope,
  review: Pick<StoredReview, 'trial_id' | 'subject' | 'subject_hash'> & {
    state: 'asked' | 'unchecked';
    personId: string;
  },
): Promise<string> {
  const { personId, ...row } = review;
  const before = await findLatestReview(scope, review.trial_id, review.subject);
  const id = newId();
  const round = (before?.round ?? 0) + 1;
  await insertReview(scope, { ...row, id, round, asked_by: personId });
  await recordActivity(scope, {
    kind: review.state === 'asked' ? 'review.asked' : 'review.skipped',
    subjectId: id,
    trialId: review.trial_id,
    details: { subject: review.subject, round, hash: review.subject_hash },
  });
  return id;
}

/**
 * Sends a complete draft to those who may agree to it, and tells them.
 * @throws AppError `invalid` naming what is missing, `no-reviewer` where nobody else could look
 */
export async function sendForReview(
  scope: ShopScope,
  which: { trial: Trial; revision: number },
  reader: TrialReader,
): Promise<void> {
  const { trial, revision } = which;
  const step = await findStep(scope, trial, 'send for review', reader);
  const { answers } = await readStoredAnswers(scope, trial.id);
  const latest = await findLatestPlan(scope, trial.id);
  const plan = await requireComplete(scope, { answers, plan: latest, ready: false });
  const reviewers = (await listReviewers(scope)).filter((id) => id !== reader.personId);
  if (reviewers.length === 0) throw new AppError('no-reviewer');
  await takeStep(scope, trial, step, revision);
  const id = await openReview(scope, {
    trial_id: trial.id,
    subject: 'plan',
    subject_hash: hashOfReviewed(answers, plan),
    state: 'asked',
    personId: reader.personId,
  });
  await tellReviewers(scope, { trial, review: { id, askedBy: reader.personId }, reviewers });
}

const decisions = {
  approve: { event: 'approve', state: 'approved', kind: 'review.approved' },
  'send-back': { event: 'send back', state: 'sent back', kind: 'review.sent-back' },
  'take-back': { event: 'take back', state: 'taken back', kind: 'review.taken-back' },
} as const;
export type ReviewDecision = keyof typeof decisions;

/**
 * Agrees to what was asked, sends it back, or takes it back. Nobody decides what they asked for; an agreement holds for
 * exactly what stands.
 * @throws AppError `own-review`, `forbidden`, `not-now`, `changed-meanwhile` with the present review
 */
export function decideReview(
  scope: ShopScope,
  which: { id: string; round: number; decision: ReviewDecision },
  reader: TrialReader,
): Promise<PublicReview> {
  return inTransaction(scope, async (inner) => {
    const review = await findReviewOf(inner, which.id);
    const trial = await findTrialOf(inner, review.trial_id);
    const { event, state, kind } = decisions[which.decision];
    const step = await findStep(inner, trial, event, reader);
    const isOwn = review.asked_by === reader.personId;
    if (isOwn && step.when?.includes('not the one who asked')) throw new AppError('own-review');
    const isCurrent =
      review.round === which.round && review.subject_hash === (await presentHash(inner, review));
    const decided =
      isCurrent && (await decideAskedReview(inner, review.id, { state, decidedBy: reader.personId }));
    if (!decided) {
      throw new AppError('changed-meanwhile', { present: await showReview(inner, review, reader) });
    }
    await takeStep(inner, trial, step);
    await recordActivity(inner, {
      kind,
      subjectId: review.id,
      trialId: trial.id,
      details: { subject: review.subject, round: review.round, hash: review.subject_hash },
    });
    if (state !== 'taken back') {
      const follow = review.subject === 'plan' ? tellAsker : afterSignOff;
      await follow(inner, { trial, review, decision: state, reviewerId: reader.personId });
    }
    return showReview(inner, await findReviewOf(inner, review.id), reader);
  });
}
