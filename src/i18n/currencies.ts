import type { Language } from './languages.ts';

/** Currencies a shop may reckon in, by their ISO 4217 codes. */
export const currencies = [
  'AED',
  'ARS',
  'AUD',
  'BDT',
  'BGN',
  'BRL',
  'CAD',
  'CHF',
  'CLP',
  'CNY',
  'COP',
  'CRC',
  'CZK',
  'DKK',
  'DOP',
  'EGP',
  'EUR',
  'GBP',
  'GTQ',
  'HKD',
  'HNL',
  'HUF',
  'IDR',
  'ILS',
  'INR',
  'JPY',
  'KES',
  'KRW',
  'LKR',
  'MAD',
  'MXN',
  'MYR',
  'NGN',
  'NOK',
  'NZD',
  'PEN',
  'PHP',
  'PKR',
  'PLN',
  'PYG',
  'RON',
  'RSD',
  'SAR',
  'SEK',
  'SGD',
  'THB',
  'TND',
  'TRY',
  'TWD',
  'UAH',
  'USD',
  'UYU',
  'VND',
  'ZAR',
] as const;
export type Currency = (typeof currencies)[number];

/** The currency that a shop which speaks this language most likely reckons in: a first proposal, no more. */
export const likelyCurrency: Record<Language, Currency> = { en: 'USD', es: 'MXN', pl: 'PLN', vi: 'VND' };

/** All currencies by code with their names in the reader's language, for a list to pick from. */
export function currencyOptions(language: Language): { value: Currency; label: string }[] {
  const names = new Intl.DisplayNames(language, { type: 'currency' });
  return currencies.map((code) => ({ value: code, label: `${code} · ${names.of(code) ?? code}` }));
}
