import { keyedHash } from '../../server/auth/token.ts';
import { now } from '../../server/clock.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';
import type { ConsentState } from './person.ts';

/** What recognises an opted-out number again without being readable. */
function hashOf(phone: string): string {
  return keyedHash('suppressed phone', phone);
}

/**
 * Moves a person's consent on, if it stands where the step begins.
 * @returns the wording they were asked with; null where nothing moved
 */
export async function moveConsent(
  scope: ShopScope,
  personId: string,
  step: { from: readonly ConsentState[]; to: ConsentState; columns?: Record<string, unknown> },
): Promise<{ wording: number | null } | null> {
  const [moved] = await scope
    .db('people')
    .where({ shop_id: scope.shopId, id: personId })
    .whereIn('consent', [...step.from])
    .update({
      consent: step.to,
      consent_at: now(),
      ...step.columns,
      revision: scope.db.raw('revision + 1'),
      updated_at: now(),
    })
    .returning('consent_wording');
  return moved ? { wording: moved.consent_wording === null ? null : Number(moved.consent_wording) } : null;
}

/** Remembers that the owner of this number wants no texts, when the row that says so loses the number. */
export async function suppressPhone(scope: ShopScope, phone: string): Promise<void> {
  await scope
    .db('suppressed_phones')
    .insert({ id: newId(), shop_id: scope.shopId, phone_hmac: hashOf(phone), created_at: now() })
    .onConflict(['shop_id', 'phone_hmac'])
    .ignore();
}

export async function releasePhone(scope: ShopScope, phone: string): Promise<void> {
  await scope
    .db('suppressed_phones')
    .where({ shop_id: scope.shopId, phone_hmac: hashOf(phone) })
    .delete();
}

export async function isSuppressed(scope: ShopScope, phone: string): Promise<boolean> {
  const row: unknown = await scope
    .db('suppressed_phones')
    .where({ shop_id: scope.shopId, phone_hmac: hashOf(phone) })
    .first('id');
  return row !== undefined;
}

/** Takes back what was to be texted to a person and has not left yet. */
export async function cancelWaitingTexts(scope: ShopScope, personId: string): Promise<number> {
  return scope
    .db('messages')
    .where({ shop_id: scope.shopId, person_id: personId, channel: 'text', state: 'waiting' })
    .update({ state: 'cancelled' });
}
