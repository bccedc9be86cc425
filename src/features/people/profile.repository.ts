import { now } from '../../server/clock.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import type { ChangeProfile } from './profile.schema.ts';

/** Keeps what a person set for themselves. */
export async function updateProfile(
  scope: ShopScope,
  personId: string,
  change: ChangeProfile,
): Promise<void> {
  await scope
    .db('people')
    .where({ shop_id: scope.shopId, id: personId })
    .update({ ...change, revision: scope.db.raw('revision + 1'), updated_at: now() });
}
