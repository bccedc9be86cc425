import type { TFunction } from 'i18next';
import { formatsFor } from '../../../i18n/format.ts';
import type { Language } from '../../../i18n/languages.ts';
import type { Proposal, ResponseSpec } from '../../../lib/doe/index.ts';

type Translate = TFunction<'wizard-frame'>;

/** Two figures are enough for what is a promise, not a reading. */
export function roundForPromise(size: number): number {
  return Number(size.toPrecision(2));
}

/** Money from whole units, without cents: a plan's cost is a guess. */
export function aboutMoney(amount: number, currency: string, language: Language): string {
  const format = new Intl.NumberFormat(language, { style: 'currency', currency, maximumFractionDigits: 0 });
  return format.format(amount);
}

/** How long a plan takes, as one says it: minutes up to an hour and a half, then half hours. */
export function aboutTime(minutes: number, t: Translate, language: Language): string {
  if (minutes < 90) return t('soFar.minutes', { count: Math.max(5, Math.round(minutes / 5) * 5) });
  const hours = Math.round(minutes / 30) / 2;
  const number = formatsFor(language, 'UTC').number(hours);
  return t('soFar.hours', { count: hours, number });
}

/** A size of the result as people say it: rejects as a count of the lot. */
export function sizeOfResult(size: number, response: ResponseSpec, t: Translate, language: Language): string {
  const { number } = formatsFor(language, 'UTC');
  if (response.kind === 'rejects') {
    const lot = response.lotSize ?? 100;
    return t('soFar.outOf', { number: number(roundForPromise(size * lot)), lot: number(lot) });
  }
  return `${number(roundForPromise(size))} ${response.unit}`.trim();
}

/** The smallest change that a plan would most likely spot, in words; null where it cannot say. */
export function spotsWords(
  { detectable }: Proposal,
  response: ResponseSpec,
  t: Translate,
  language: Language,
): string | null {
  const [first] = detectable;
  if (!first) return null;
  if (first.unit === 'response') {
    return t('soFar.spots', { size: sizeOfResult(first.size, response, t, language) });
  }
  const number = formatsFor(language, 'UTC').number(roundForPromise(first.size));
  return t('soFar.spotsTimes', { number });
}
