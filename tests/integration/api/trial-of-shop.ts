import type { ShopScope } from '../../../src/server/db/scope.ts';
import { newId } from '../../../src/server/ids.ts';

const at = Date.UTC(2026, 0, 5, 8);

/** A draft that is with the reviewer, with one remark; answers the ids of trial and review. */
export async function buildReviewedTrial(
  scope: ShopScope,
  ownerId: string,
): Promise<{ trialId: string; reviewId: string }> {
  const { db, shopId } = scope;
  const [trialId, reviewId] = [newId(), newId()];
  const row = { shop_id: shopId, created_at: at };
  await db('trials').insert({
    ...row,
    id: trialId,
    number: 1,
    title: 'Line 3 seals',
    title_search: 'line 3 seals',
    machine: 'Line 3',
    machine_search: 'line 3',
    owner_id: ownerId,
    state: 'plan review',
    updated_at: at,
  });
  await db('answers').insert({
    ...row,
    id: newId(),
    trial_id: trialId,
    version: 1,
    question_versions: '{"v":1,"questions":{}}',
    document: '{"v":1,"questions":{}}',
    updated_by: ownerId,
    updated_at: at,
  });
  await db('reviews').insert({
    id: reviewId,
    shop_id: shopId,
    trial_id: trialId,
    subject: 'plan',
    subject_hash: 'x',
    round: 1,
    state: 'asked',
    asked_by: ownerId,
    asked_at: at,
  });
  return { trialId, reviewId };
}
