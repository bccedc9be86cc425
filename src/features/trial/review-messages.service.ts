import type { ShopScope } from '../../server/db/scope.ts';
import { config } from '../../server/env.ts';
import { queueMessage } from '../message/message.service.ts';
import { readNames } from '../people/people.repository.ts';
import { findShop } from '../shop/shop.repository.ts';
import type { StoredReview } from './review.repository.ts';
import type { Trial } from './trial.ts';

function titleOf({ title, number }: Pick<Trial, 'title' | 'number'>): string {
  return title === '' ? `#${number}` : title;
}

/** Tells those who may agree that a plan waits, by mail and by text. */
export async function tellReviewers(
  scope: ShopScope,
  about: { trial: Trial; review: { id: string; askedBy: string }; reviewers: readonly string[] },
): Promise<void> {
  const { trial, review, reviewers } = about;
  const shop = (await findShop(scope)).name;
  const asker = (await readNames(scope, [review.askedBy])).get(review.askedBy) ?? '';
  const words = { asker, trial: titleOf(trial) };
  for (const personId of reviewers) {
    const common = { personId, trialId: trial.id };
    const link = `${config().appUrl}/trials/${trial.id}/review`;
    await queueMessage(scope, {
      ...common,
      template: 'planWaiting',
      params: { ...words, link },
      dedupe: `plan-waiting-mail:${review.id}:${personId}`,
    });
    await queueMessage(scope, {
      ...common,
      template: 'planWaitingText',
      params: { ...words, shop },
      dedupe: `plan-waiting-text:${review.id}:${personId}`,
    });
  }
}

const templatesOf = {
  approved: ['planApproved', 'planApprovedText'],
  'sent back': ['planSentBack', 'planSentBackText'],
} as const;

/** Tells whoever asked what became of the plan. */
export async function tellAsker(
  scope: ShopScope,
  about: { trial: Trial; review: StoredReview; decision: keyof typeof templatesOf; reviewerId: string },
): Promise<void> {
  const { trial, review, decision, reviewerId } = about;
  const shop = (await findShop(scope)).name;
  const reviewer = (await readNames(scope, [reviewerId])).get(reviewerId) ?? '';
  const words = { reviewer, trial: titleOf(trial) };
  const common = { personId: review.asked_by, trialId: trial.id };
  const [mail, text] = templatesOf[decision];
  const link = `${config().appUrl}/trials/${trial.id}/start`;
  await queueMessage(scope, {
    ...common,
    template: mail,
    params: { ...words, link },
    dedupe: `plan-decided-mail:${review.id}`,
  });
  await queueMessage(scope, {
    ...common,
    template: text,
    params: { ...words, shop },
    dedupe: `plan-decided-text:${review.id}`,
  });
}
