import { z } from 'zod';
import type { ShopScope } from '../../server/db/scope.ts';

const personRow = z.object({ id: z.string(), name: z.string() });
export type CrewPerson = z.output<typeof personRow>;

/** Everybody who may be given a run: active operators and line phones, by name. */
export async function listOperators(scope: ShopScope): Promise<CrewPerson[]> {
  const { db, shopId } = scope;
  const operators = db('person_roles').where({ shop_id: shopId, role: 'operator' }).select('person_id');
  const rows = await db('people')
    .where({ shop_id: shopId, active: true })
    .whereIn('id', operators)
    .orderBy('name_search')
    .select('id', 'name');
  return z.array(personRow).parse(rows);
}

/** Whether this is a phone of a place, which whoever is on shift holds. */
export async function isLinePhone(scope: ShopScope, id: string): Promise<boolean> {
  const row: unknown = await scope
    .db('people')
    .where({ shop_id: scope.shopId, id, kind: 'line phone' })
    .first('id');
  return row !== undefined;
}

export async function isActivePerson(scope: ShopScope, id: string): Promise<boolean> {
  const row: unknown = await scope
    .db('people')
    .where({ shop_id: scope.shopId, id, active: true })
    .first('id');
  return row !== undefined;
}
