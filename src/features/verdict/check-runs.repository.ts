import type { ShopScope } from '../../server/db/scope.ts';

/** How many runs the trial has so far, of all phases: numbers go on after them. */
export async function countRuns(scope: ShopScope, trialId: string): Promise<number> {
  const last = await scope
    .db('runs')
    .where({ shop_id: scope.shopId, trial_id: trialId })
    .max({ number: 'number' })
    .first();
  return Number(last?.['number'] ?? 0);
}

/** From here on readings are those of check runs. */
export async function beginCheckPhase(scope: ShopScope, trialId: string): Promise<void> {
  await scope.db('trials').where({ shop_id: scope.shopId, id: trialId }).update({ phase: 'check' });
}
