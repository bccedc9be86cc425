import { z } from 'zod';
import { currencies } from '../../i18n/currencies.ts';
import { languages } from '../../i18n/languages.ts';
import { isTimeZone } from '../../i18n/time-zones.ts';
import { personNameSchema } from '../people/person.schema.ts';
import '../people/schema-settings.ts';
import { keepTextsDaysRange, reviewRules, type Shop } from './shop.ts';

const statementLength = { least: 10, most: 300 } as const;
const minuteOfDay = z.number().int().min(0).max(1_439).nullable();
const reviewRule = z.enum(reviewRules);

/** The settings as the form asks for them. The number is checked on the server, which knows every country's. */
export const shopFieldSchemas = {
  name: personNameSchema,
  timeZone: z.string().refine(isTimeZone, { error: 'not-a-time-zone' }),
  language: z.enum(languages),
  currency: z.enum(currencies),
  textNumber: z.preprocess(
    (typed) => (typeof typed === 'string' && typed.trim() === '' ? null : typed),
    z.string().trim().max(40).nullable(),
  ),
  quietFromMinute: minuteOfDay,
  quietToMinute: minuteOfDay,
  planReview: reviewRule,
  verdictReview: reviewRule,
  adoptionReview: reviewRule,
  reviewStatement: z.preprocess(
    (typed) => (typeof typed === 'string' && typed.trim() === '' ? null : typed),
    z.string().trim().max(statementLength.most).nullable(),
  ),
  plainLetters: z.boolean(),
  keepTextsDays: z.number().int().min(keepTextsDaysRange.least).max(keepTextsDaysRange.most),
  monthlyTextLimit: z.number().int().min(1).max(1_000_000).nullable(),
};
export type ShopFields = Omit<Shop, 'id' | 'revision'>;

export interface ShopFault {
  field: 'quietFromMinute' | 'quietToMinute' | 'reviewStatement';
  code: 'pair-needed' | 'statement-needed';
}

/** What is wrong with the settings as a whole. */
export function shopFaults(
  shop: Pick<ShopFields, 'quietFromMinute' | 'quietToMinute' | 'planReview' | 'reviewStatement'>,
): ShopFault[] {
  const faults: ShopFault[] = [];
  if (shop.quietFromMinute === null && shop.quietToMinute !== null) {
    faults.push({ field: 'quietFromMinute', code: 'pair-needed' });
  }
  if (shop.quietToMinute === null && shop.quietFromMinute !== null) {
    faults.push({ field: 'quietToMinute', code: 'pair-needed' });
  }
  // Without an engineer's look somebody must answer for safety, and say so in so many words.
  const isUnsaid = (shop.reviewStatement ?? '').length < statementLength.least;
  if (shop.planReview === 'never' && isUnsaid) {
    faults.push({ field: 'reviewStatement', code: 'statement-needed' });
  }
  return faults;
}

export const shopFormSchema = z.strictObject(shopFieldSchemas).superRefine((shop, context) => {
  for (const { field, code } of shopFaults(shop)) {
    context.addIssue({ code: 'custom', path: [field], message: code, input: shop[field] });
  }
});

/** PATCH /api/shop. What is left out stays. */
export const changeShopSchema = z
  .strictObject(shopFieldSchemas)
  .partial()
  .extend({ revision: z.number().int().positive() });
export type ChangeShop = z.output<typeof changeShopSchema>;

/** The shop as the API and the form see it. */
export const publicShopSchema = z.object({ ...shopFieldSchemas, revision: z.number() });
export type PublicShop = z.output<typeof publicShopSchema>;
