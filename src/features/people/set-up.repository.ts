import { now } from '../../server/clock.ts';
import { foldForSearch } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';
import type { SetUp } from './set-up.schema.ts';
import { storeWorkHours, usualWorkSpans } from './work-hours.ts';

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

/** Adds the shop's first person, an admin. @returns the person's id */
export async function insertFirstAdmin(
  scope: ShopScope,
  admin: Pick<SetUp, 'name' | 'email' | 'language'> & { passwordHash: string },
): Promise<string> {
  const id = newId();
  const at = now();
  await scope.db('people').insert({
    id,
    shop_id: scope.shopId,
    kind: 'person',
    name: admin.name,
    name_search: foldForSearch(admin.name),
    email: admin.email,
    language: admin.language,
    password_hash: admin.passwordHash,
    work_hours: storeWorkHours(usualWorkSpans),
    created_at: at,
    updated_at: at,
  });
  await scope.db('person_roles').insert({
    id: newId(),
    shop_id: scope.shopId,
    person_id: id,
    role: 'admin',
  });
  return id;
}

/** The name that the shop was announced under, empty when there was none. */
export async function readShopName(scope: ShopScope): Promise<string> {
  const row = await scope.db('shops').where({ id: scope.shopId }).first('name');
  return String(row?.name ?? '');
}
