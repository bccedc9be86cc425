import type { Knex } from 'knex';
import { inTransaction } from '../../server/db/in-transaction.ts';
import { deleteShopRows, findShopId } from './remove-shop.repository.ts';

/**
 * Removes a shop with all that belongs to it: people, trials, readings, texts and its log. Other shops are not touched.
 * This cannot be undone; backups made before still hold it until they age out.
 * @param idOrName the shop's id, or its name where no other shop has it
 * @returns whether there was such a shop
 */
export async function removeShop(db: Knex, idOrName: string): Promise<boolean> {
  return inTransaction({ db }, async (inner) => {
    const shopId = await findShopId(inner.db, idOrName);
    if (shopId === null) return false;
    await deleteShopRows({ db: inner.db, shopId, actor: { kind: 'command', id: null } });
    return true;
  });
}
