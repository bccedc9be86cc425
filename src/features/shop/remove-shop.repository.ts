import { allowChanges, refuseChanges } from '../../server/db/schema-parts.ts';
import type { ShopScope } from '../../server/db/scope.ts';

/** Every table with rows of a shop, children before parents. A test reads the schema and refuses one that is missing. */
export const shopTables = [
  'models',
  'decisions',
  'verdicts',
  'notes',
  'problems',
  'review_comments',
  'reviews',
  'phrases',
  'answers',
  'conversations',
  'photos',
  'readings',
  'inbox_texts',
  'messages',
  'runs',
  'stretches',
  'plans',
  'sessions',
  'links',
  'api_tokens',
  'trials',
  'suppressed_phones',
  'person_roles',
  'people',
  'activity',
] as const;

/** Deletes every row of a shop and the shop itself, in the transaction at hand. */
export async function deleteShopRows(scope: ShopScope): Promise<void> {
  const { db, shopId } = scope;
  if (!db.isTransaction) throw new RangeError('deleteShopRows: scope must hold a transaction');
  // The log and verdicts only grow and answers freeze, save here: their guards are lifted for this transaction only.
  for (const grown of ['activity', 'verdicts']) await allowChanges(db, grown);
  await allowChanges(db, 'answers');
  for (const table of shopTables) await db(table).where({ shop_id: shopId }).delete();
  for (const grown of ['activity', 'verdicts']) await refuseChanges(db, grown);
  await refuseChanges(db, 'answers', 'frozen_hash');
  await db('shops').where({ id: shopId }).delete();
}

/** The shop with this id or exactly this name. @returns null where there is none or the name is not one shop's alone */
export async function findShopId(db: ShopScope['db'], idOrName: string): Promise<string | null> {
  const rows: { id: unknown }[] = await db('shops')
    .where({ id: idOrName })
    .orWhere({ name: idOrName })
    .select('id');
  const [only, second] = rows;
  return only && !second ? String(only.id) : null;
}
