import { beforeAll, describe, expect, it } from 'vitest';
import { saveAnswer } from '../../../src/features/trial/answers.service.ts';
import { findLatestReview } from '../../../src/features/trial/review.repository.ts';
import { decideReview } from '../../../src/features/trial/review.service.ts';
import { deleteTrial } from '../../../src/features/trial/trial.service.ts';
import { carryOutEvent } from '../../../src/features/trial/trial-event.service.ts';
import type { TrialReader } from '../../../src/features/trial/trial-reader.service.ts';
import { type TrialEvent, transitionsOf, trialStates } from '../../../src/features/trial/trial-states.ts';
import { AppError } from '../../../src/server/errors.ts';
import { newId } from '../../../src/server/ids.ts';
import { act, buildPlanned, buildTrialShop, read, type TrialShop } from './trial-fixture.ts';

const carriedOut = [
  'send for review',
  'start',
  'approve',
  'send back',
  'take back',
  'change an answer',
  'delete',
] as const satisfies readonly TrialEvent[];
type Carried = (typeof carriedOut)[number];

let shop: TrialShop;
let sam: TrialReader;

beforeAll(async () => {
  // Nobody is asked by rule, so that the start of a draft hangs on its state alone.
  shop = await buildTrialShop({ plan_review: 'never' });
  sam = await shop.add(['engineer']);
});

/** Does it as somebody who may, with everything else in order. */
async function perform(trialId: string, event: Carried): Promise<unknown> {
  const { revision } = await read(shop, trialId);
  switch (event) {
    case 'send for review':
    case 'start':
      return carryOutEvent(shop.scope, { trialId, body: { event, revision } }, shop.dana);
    case 'change an answer': {
      const base = (await read(shop, trialId)).questions.worth?.version ?? 0;
      const wish = { trialId, question: 'worth', content: { change: '2,9' }, base, save: newId() } as const;
      return saveAnswer(shop.scope, wish, shop.dana);
    }
    case 'delete':
      return deleteTrial(shop.scope, { id: trialId, revision }, shop.dana);
    default: {
      const review = await findLatestReview(shop.scope, trialId, 'plan');
      const reader = event === 'take back' ? shop.dana : sam;
      const decision = event.replace(' ', '-') as 'approve' | 'send-back' | 'take-back';
      const which = { id: review?.id ?? '', round: review?.round ?? 0, decision };
      return decideReview(shop.as(reader), which, reader);
    }
  }
}

/** A trial with a review that is asked for, or approved in `ready`, moved to a state. */
async function inState(state: (typeof trialStates)[number]): Promise<string> {
  const id = await buildPlanned(shop);
  await act(shop, id, 'send for review');
  const reviews = shop.scope.db('reviews').where({ trial_id: id });
  if (state === 'ready') await reviews.update({ state: 'approved' });
  if (state === 'draft') await reviews.update({ state: 'taken back' });
  await shop.scope.db('trials').where({ id }).update({ state });
  return id;
}

/** Reviews of a verdict and of an adoption have a subject of their own, and tests of their own in `verdict/sign-off`. */
const isOfPlan = (state: string, event: TrialEvent) =>
  !(/^(verdict|adoption) review$/.test(state) && (event === 'approve' || event === 'send back')) &&
  !(state === 'readings in' && event === 'send for review');
const cells = trialStates.flatMap((state) =>
  carriedOut.filter((event) => isOfPlan(state, event)).map((event) => ({ state, event })),
);

describe.each(cells)('$event in $state', ({ state, event }) => {
  it('does what the table says', async () => {
    const steps = transitionsOf(state, event);
    const id = await inState(state);
    const outcome = await perform(id, event).then(
      () => null,
      (error: unknown) => (error instanceof AppError ? error.code : error),
    );
    const row = await shop.scope.db('trials').where({ id }).first('state');
    const expected = steps.length === 0 ? ['not-now', state] : [null, steps[0]?.to];
    expect([outcome, row?.state ?? 'gone']).toEqual(expected);
  });
});
