import { now } from '../../server/clock.ts';
import type { ShopScope } from '../../server/db/scope.ts';

/** Keeps the hash of a person's new password. The person's revision stays: nobody edits a password beside others. */
export async function storePasswordHash(
  scope: ShopScope,
  person: { personId: string; passwordHash: string },
): Promise<void> {
  await scope
    .db('people')
    .where({ shop_id: scope.shopId, id: person.personId })
    .update({ password_hash: person.passwordHash, updated_at: now() });
}
