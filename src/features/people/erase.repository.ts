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

/** Where a person's own words stand, beside the column that says whose they are. */
const ownWords = [
  { table: 'review_comments', by: 'written_by' },
  { table: 'notes', by: 'written_by' },
  { table: 'problems', by: 'raised_by' },
] as const;

/** Blanks what a person remarked in reviews and on runs; that there was a remark, and where, stays. */
export async function blankRemarksOfPerson(scope: ShopScope, personId: string): Promise<void> {
  for (const { table, by } of ownWords) {
    await scope
      .db(table)
      .where({ shop_id: scope.shopId, [by]: personId })
      .update({ words: '' });
  }
}

/** Pictures that a person sent go with their words; the run keeps its figures. */
export async function removePhotosOfPerson(scope: ShopScope, personId: string): Promise<void> {
  await scope.db('photos').where({ shop_id: scope.shopId, sent_by: personId }).delete();
}

/** Removes what served the person alone: sessions, links, tokens, roles. */
export async function removeBelongings(scope: ShopScope, personId: string): Promise<void> {
  for (const table of ['sessions', 'links', 'api_tokens', 'person_roles']) {
    await scope.db(table).where({ shop_id: scope.shopId, person_id: personId }).delete();
  }
}
