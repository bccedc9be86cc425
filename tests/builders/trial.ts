import type { ShopScope } from '../../src/server/db/scope.ts';
import { newId } from '../../src/server/ids.ts';
import { buildPerson } from './shop.ts';

const builtAt = Date.UTC(2026, 0, 5, 8);

/** A running trial with one run in the given state, on the person it hangs on; answers the ids. */
export async function buildRun(
  scope: ShopScope,
  run: { personId: string; state: string },
): Promise<{ id: string; trialId: string }> {
  const { db, shopId } = scope;
  const ownerId = await buildPerson(scope, ['supervisor']);
  const [trialId, planId, id] = [newId(), newId(), newId()];
  const counted = await db('trials').where({ shop_id: shopId }).count({ count: '*' }).first();
  await db('trials').insert({
    id: trialId,
    shop_id: shopId,
    number: Number(counted?.['count'] ?? 0) + 1,
    title: 'Line 3 seals',
    title_search: 'line 3 seals',
    machine: 'Line 3',
    machine_search: 'line 3',
    owner_id: ownerId,
    state: 'running',
    created_at: builtAt,
    updated_at: builtAt,
  });
  await db('plans').insert({
    id: planId,
    shop_id: shopId,
    trial_id: trialId,
    n: 1,
    phase: 'main',
    seed: 1,
    core_version: 'test',
    brief: '{"v":1}',
    proposal: '{"v":1}',
    hash: 'test',
    chosen_by: ownerId,
    created_at: builtAt,
  });
  await db('runs').insert({
    id,
    shop_id: shopId,
    trial_id: trialId,
    plan_id: planId,
    number: 1,
    place: 1,
    block: 1,
    group_key: 'a',
    center: false,
    coded: '{"v":1}',
    planned: '{"v":1}',
    state: run.state,
    person_id: run.personId,
  });
  return { id, trialId };
}
