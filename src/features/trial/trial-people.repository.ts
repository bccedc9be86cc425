import { z } from 'zod';
import { type Language, languages } from '../../i18n/languages.ts';
import type { ShopScope } from '../../server/db/scope.ts';

/** Everybody who may agree to a plan: engineers and the shop's safety people, who are active and can sign in. */
export async function listReviewers(scope: ShopScope): Promise<string[]> {
  const { db, shopId } = scope;
  const engineers = db('person_roles').where({ shop_id: shopId, role: 'engineer' }).select('person_id');
  const signingIn = db('person_roles')
    .where({ shop_id: shopId })
    .whereNot({ role: 'operator' })
    .select('person_id');
  const ids: unknown[] = await db('people')
    .where({ shop_id: shopId, active: true })
    .whereNotNull('password_hash')
    .whereIn('id', signingIn)
    .andWhere((may) => may.where({ safety_person: true }).orWhereIn('id', engineers))
    .orderBy('id')
    .pluck('id');
  return ids.map(String);
}

const memberRow = z.object({ id: z.string(), language: z.enum(languages) });

/** Those of these people who are on the crew now, with the language they read. */
export async function listCrewMembers(
  scope: ShopScope,
  ids: readonly string[],
): Promise<{ id: string; language: Language }[]> {
  const rows = await scope
    .db('people')
    .where({ shop_id: scope.shopId, active: true })
    .whereIn('id', [...new Set(ids)])
    .select('id', 'language');
  return z.array(memberRow).parse(rows);
}
