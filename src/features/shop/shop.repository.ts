import { z } from 'zod';
import { languages } from '../../i18n/languages.ts';
import { now } from '../../server/clock.ts';
import { flag } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { reviewRules, type Shop } from './shop.ts';

const shopRow = z.object({
  id: z.string(),
  name: z.string(),
  time_zone: z.string(),
  language: z.enum(languages),
  currency: z.string(),
  text_number: z.string().nullable(),
  quiet_from_minute: z.number().nullable(),
  quiet_to_minute: z.number().nullable(),
  plan_review: z.enum(reviewRules),
  verdict_review: z.enum(reviewRules),
  adoption_review: z.enum(reviewRules),
  review_statement: z.string().nullable(),
  plain_letters: flag,
  keep_texts_days: z.number(),
  monthly_text_limit: z.number().nullable(),
  revision: z.number(),
});

function toShop(row: z.output<typeof shopRow>): Shop {
  return {
    id: row.id,
    name: row.name,
    timeZone: row.time_zone,
    language: row.language,
    currency: row.currency,
    textNumber: row.text_number,
    quietFromMinute: row.quiet_from_minute,
    quietToMinute: row.quiet_to_minute,
    planReview: row.plan_review,
    verdictReview: row.verdict_review,
    adoptionReview: row.adoption_review,
    reviewStatement: row.review_statement,
    plainLetters: row.plain_letters,
    keepTextsDays: row.keep_texts_days,
    monthlyTextLimit: row.monthly_text_limit,
    revision: row.revision,
  };
}

/** The one shop of the scope. @throws RangeError when the scope names none */
export async function findShop(scope: ShopScope): Promise<Shop> {
  const row: unknown = await scope.db('shops').where({ id: scope.shopId }).first();
  if (!row) throw new RangeError('findShop: scope.shopId is not a shop');
  return toShop(shopRow.parse(row));
}

/** Whether another shop of the installation already receives texts at this number. */
export async function isTextNumberTaken(scope: ShopScope, number: string): Promise<boolean> {
  const row: unknown = await scope
    .db('shops')
    .where({ text_number: number })
    .whereNot({ id: scope.shopId })
    .first('id');
  return row !== undefined;
}

/** Changes the shop if it is still as the reader saw it. @returns whether it was changed */
export async function updateShop(
  scope: ShopScope,
  revision: number,
  change: Partial<Omit<Shop, 'id' | 'revision'>>,
): Promise<boolean> {
  const columns = {
    name: change.name,
    time_zone: change.timeZone,
    language: change.language,
    currency: change.currency,
    text_number: change.textNumber,
    quiet_from_minute: change.quietFromMinute,
    quiet_to_minute: change.quietToMinute,
    plan_review: change.planReview,
    verdict_review: change.verdictReview,
    adoption_review: change.adoptionReview,
    review_statement: change.reviewStatement,
    plain_letters: change.plainLetters,
    keep_texts_days: change.keepTextsDays,
    monthly_text_limit: change.monthlyTextLimit,
  };
  const set = Object.fromEntries(Object.entries(columns).filter(([, value]) => value !== undefined));
  const changed = await scope
    .db('shops')
    .where({ id: scope.shopId, revision })
    .update({ ...set, revision: scope.db.raw('revision + 1'), updated_at: now() });
  return changed > 0;
}
