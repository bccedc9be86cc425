import { parseTypedNumber } from '../../i18n/format.ts';
import type { Language } from '../../i18n/languages.ts';
import { formatWallTime, parseWallTime } from '../people/work-hours.ts';
import type { PublicShop } from './shop.schema.ts';
import type { ReviewRule } from './shop.ts';

/** What the form holds: texts as typed. */
export interface ShopFormValues {
  name: string;
  timeZone: string;
  language: Language;
  currency: PublicShop['currency'];
  textNumber: string;
  quietFromMinute: string;
  quietToMinute: string;
  planReview: ReviewRule;
  verdictReview: ReviewRule;
  adoptionReview: ReviewRule;
  reviewStatement: string;
  plainLetters: boolean;
  keepTextsDays: string;
  monthlyTextLimit: string;
}

function typedMinute(minute: number | null): string {
  return minute === null ? '' : formatWallTime(minute);
}

export function shopValues(shop: PublicShop): ShopFormValues {
  const { revision: _, ...fields } = shop;
  return {
    ...fields,
    textNumber: shop.textNumber ?? '',
    quietFromMinute: typedMinute(shop.quietFromMinute),
    quietToMinute: typedMinute(shop.quietToMinute),
    reviewStatement: shop.reviewStatement ?? '',
    keepTextsDays: String(shop.keepTextsDays),
    monthlyTextLimit: shop.monthlyTextLimit === null ? '' : String(shop.monthlyTextLimit),
  };
}

/** A typed figure; what is none is handed on as it is, so that the schema names it. */
function readNumber(typed: string): number | string {
  return parseTypedNumber(typed) ?? typed;
}

/** What was typed, as the endpoint asks for it. */
export function toShopFields(values: ShopFormValues) {
  const { quietFromMinute, quietToMinute, monthlyTextLimit, keepTextsDays } = values;
  return {
    ...values,
    quietFromMinute: quietFromMinute === '' ? null : (parseWallTime(quietFromMinute) ?? quietFromMinute),
    quietToMinute: quietToMinute === '' ? null : (parseWallTime(quietToMinute) ?? quietToMinute),
    keepTextsDays: readNumber(keepTextsDays),
    monthlyTextLimit: monthlyTextLimit.trim() === '' ? null : readNumber(monthlyTextLimit),
  };
}
