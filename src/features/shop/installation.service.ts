import type { Knex } from 'knex';
import { createLink, revokeLinks } from '../../server/auth/links.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { config } from '../../server/env.ts';
import { findShops, type InstalledShop, insertAnnouncedShop } from './installation.repository.ts';

/** Shops come and go from the machine that Trywell runs on: no person signed in to one shop may touch another. */
function scopeOfCommand(db: Knex, shopId: string): ShopScope {
  return { db, shopId, actor: { kind: 'command', id: null } };
}

/** A new set-up link for a shop that waits for it; earlier ones end. */
async function renewSetUpLink(scope: ShopScope): Promise<string> {
  await revokeLinks(scope, { purpose: 'setup' });
  const { token } = await createLink(scope, { purpose: 'setup' });
  await recordActivity(scope, { kind: 'set-up-link.made', subjectId: scope.shopId });
  return `${config().appUrl}/setup/${token}`;
}

/** Announces a shop. @returns the address at which it is set up, once, within a day */
export async function addShop(db: Knex, name: string): Promise<string> {
  return inTransaction({ db }, async ({ db: transaction }) =>
    renewSetUpLink(scopeOfCommand(transaction, await insertAnnouncedShop(transaction, name))),
  );
}

/**
 * The set-up address of an installation in which nobody can sign in yet; null once somebody can. A start that is repeated
 * gives a new address, and the one before ends.
 */
export async function offerFirstSetUp(db: Knex): Promise<string | null> {
  return inTransaction({ db }, async ({ db: transaction }) => {
    const shops = await findShops(transaction);
    if (shops.some(({ people }) => people > 0)) return null;
    const shopId = shops[0]?.id ?? (await insertAnnouncedShop(transaction, ''));
    return renewSetUpLink(scopeOfCommand(transaction, shopId));
  });
}

export function listShops(db: Knex): Promise<InstalledShop[]> {
  return findShops(db);
}

/** Makes a new set-up link for a shop that nobody has set up yet. @returns null when somebody has */
export async function renewShopLink(db: Knex, shop: InstalledShop): Promise<string | null> {
  if (shop.people > 0) return null;
  return inTransaction({ db }, ({ db: transaction }) => renewSetUpLink(scopeOfCommand(transaction, shop.id)));
}
