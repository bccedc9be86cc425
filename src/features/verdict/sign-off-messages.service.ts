import type { ShopScope } from '../../server/db/scope.ts';
import { config } from '../../server/env.ts';
import { queueMessage } from '../message/message.service.ts';
import { readNames } from '../people/people.repository.ts';
import { findShop } from '../shop/shop.repository.ts';
import type { StoredReview } from '../trial/review.repository.ts';
import type { Trial } from '../trial/trial.ts';

/** What an engineer looks at after a trial. */
export type SignOffSubject = Exclude<StoredReview['subject'], 'plan'>;

export function isSignOff(subject: StoredReview['subject']): subject is SignOffSubject {
  return subject !== 'plan';
}

function titleOf({ title, number }: Pick<Trial, 'title' | 'number'>): string {
  return title === '' ? `#${number}` : title;
}

function linkTo({ id }: Pick<Trial, 'id'>): string {
  return `${config().appUrl}/trials/${id}/verdict`;
}

/** Tells the engineers that a verdict, or new settings, wait for them: by mail and by text. */
export async function tellEngineers(
  scope: ShopScope,
  about: {
    trial: Trial;
    what: SignOffSubject;
    review: { id: string; askedBy: string };
    engineers: readonly string[];
  },
): Promise<void> {
  const { trial, what, review, engineers } = about;
  const { name: shop } = await findShop(scope);
  const asker = (await readNames(scope, [review.askedBy])).get(review.askedBy) ?? '';
  const params = { what, asker, trial: titleOf(trial) };
  for (const personId of engineers) {
    const common = { personId, trialId: trial.id };
    const dedupe = `${review.id}:${personId}`;
    await queueMessage(scope, {
      ...common,
      template: 'signOffWaiting',
      params: { ...params, link: linkTo(trial) },
      dedupe: `sign-off-mail:${dedupe}`,
    });
    await queueMessage(scope, {
      ...common,
      template: 'signOffWaitingText',
      params: { ...params, shop },
      dedupe: `sign-off-text:${dedupe}`,
    });
  }
}

const templatesOf = {
  approved: ['signOffApproved', 'signOffApprovedText'],
  'sent back': ['signOffSentBack', 'signOffSentBackText'],
} as const;

/** Tells whoever asked what the engineer decided. */
export async function tellDecided(
  scope: ShopScope,
  about: {
    trial: Trial;
    what: SignOffSubject;
    review: StoredReview;
    decision: keyof typeof templatesOf;
    reviewerId: string;
  },
): Promise<void> {
  const { trial, what, review, decision, reviewerId } = about;
  const { name: shop } = await findShop(scope);
  const reviewer = (await readNames(scope, [reviewerId])).get(reviewerId) ?? '';
  const params = { what, reviewer, trial: titleOf(trial) };
  const common = { personId: review.asked_by, trialId: trial.id };
  const [mail, text] = templatesOf[decision];
  await queueMessage(scope, {
    ...common,
    template: mail,
    params: { ...params, link: linkTo(trial) },
    dedupe: `signed-off-mail:${review.id}`,
  });
  await queueMessage(scope, {
    ...common,
    template: text,
    params: { ...params, shop },
    dedupe: `signed-off-text:${review.id}`,
  });
}
