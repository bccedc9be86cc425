import { now } from '../../server/clock.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import type { SetUp } from './set-up.schema.ts';

/** Fills in the shop that a set-up link was made for. */
export async function completeShop(scope: ShopScope, setUp: SetUp): Promise<void> {
  await scope
    .db('shops')
    .where({ id: scope.shopId })
    .update({
      name: setUp.shopName,
      time_zone: setUp.timeZone,
      language: setUp.language,
      currency: setUp.currency,
      revision: scope.db.raw('revision + 1'),
      updated_at: now(),
    });
}

/** The name that the shop was announced under, empty when there was none. */
export async function readShopName(scope: ShopScope): Promise<string> {
  const row = await scope.db('shops').where({ id: scope.shopId }).first('name');
  return String(row?.name ?? '');
}
