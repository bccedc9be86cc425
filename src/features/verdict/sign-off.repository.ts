import type { ShopScope } from '../../server/db/scope.ts';

/** Engineers who are active and can sign in: they agree to verdicts and to new settings. */
export async function listEngineers({ db, shopId }: ShopScope): Promise<string[]> {
  const ids: unknown[] = await db('people')
    .where({ shop_id: shopId, active: true })
    .whereNotNull('password_hash')
    .whereIn('id', db('person_roles').where({ shop_id: shopId, role: 'engineer' }).select('person_id'))
    .orderBy('id')
    .pluck('id');
  return ids.map(String);
}

/** Checks a week later that have not gone out yet are not asked any more. */
export async function cancelCheckBacks({ db, shopId }: ShopScope, trialId: string): Promise<void> {
  await db('messages')
    .where({ shop_id: shopId, trial_id: trialId, state: 'waiting' })
    .whereIn('template', ['checkBack', 'checkBackText'])
    .update({ state: 'cancelled' });
}
