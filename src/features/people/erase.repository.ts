import { now } from '../../server/clock.ts';
import { foldForSearch } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { storeWorkHours } from './work-hours.ts';

/** The number the next erased person goes by. */
export async function nextFormerNumber(scope: ShopScope): Promise<number> {
  const [row] = await scope
    .db('people')
    .where({ shop_id: scope.shopId })
    .whereNotNull('erased_at')
    .count({ count: '*' });
  return Number(row?.['count'] ?? 0) + 1;
}

/** What a person's row holds once nothing in it tells who it was. The row stays: readings point at it. */
export function erasedColumns(name: string): Record<string, unknown> {
  return {
    name,
    name_search: foldForSearch(name),
    email: null,
    phone: null,
    password_hash: null,
    work_hours: storeWorkHours([]),
    consent: 'unasked',
    consent_at: null,
    consent_wording: null,
    consent_how: null,
    asked_by: null,
    safety_person: false,
    active: false,
    erased_at: now(),
  };
}

/** Blanks what a person remarked in reviews; that there was a remark, and where, stays. */
export async function blankRemarksOfPerson(scope: ShopScope, personId: string): Promise<void> {
  await scope
    .db('review_comments')
    .where({ shop_id: scope.shopId, written_by: personId })
    .update({ words: '' });
}

/** Removes what served the person alone: sessions, links, tokens, roles. */
export async function removeBelongings(scope: ShopScope, personId: string): Promise<void> {
  for (const table of ['sessions', 'links', 'api_tokens', 'person_roles']) {
    await scope.db(table).where({ shop_id: scope.shopId, person_id: personId }).delete();
  }
}
