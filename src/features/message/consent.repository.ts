import type { ShopScope } from '../../server/db/scope.ts';
import type { Consent } from './send-guard.ts';

export interface ConsentChange {
  consent: Consent;
  at: number | null;
  wording: number | null;
  how: string | null;
  askedBy: string | null;
}

/** Writes what is known of a person's consent; what is left out stays. */
export async function changeConsent(
  scope: ShopScope,
  personId: string,
  change: Partial<ConsentChange>,
  updatedAt: number,
): Promise<void> {
  const columns: Record<string, unknown> = {
    consent: change.consent,
    consent_at: change.at,
    consent_wording: change.wording,
    consent_how: change.how,
    asked_by: change.askedBy,
  };
  const set = Object.fromEntries(Object.entries(columns).filter(([, value]) => value !== undefined));
  await scope
    .db('people')
    .where({ shop_id: scope.shopId, id: personId })
    .update({ ...set, updated_at: updatedAt });
}

/** The person that texts from this number belong to. */
export async function findPersonByPhone(scope: ShopScope, phone: string): Promise<string | null> {
  const found = await scope
    .db('people')
    .where({ shop_id: scope.shopId, phone })
    .whereNull('erased_at')
    .first('id');
  return found ? String(found.id) : null;
}
