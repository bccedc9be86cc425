import type { TFunction } from 'i18next';
import { formatsFor } from '../../i18n/format.ts';
import type { Language } from '../../i18n/languages.ts';
import type { Brief, FactRefs } from '../../lib/doe/index.ts';

export type FactTranslate = TFunction<'plan-facts'>;

/** A promise is no reading: two figures are enough. */
export function roundForPromise(size: number): number {
  return Number(size.toPrecision(2));
}

/** How facts are said in one shop and one language: its own names for settings and results, its units, its figures. */
export interface FactSpeech {
  brief: Brief;
  t: FactTranslate;
  /** Up to three decimals. */
  number(value: number): string;
  /** A size of the main result as people say it: bad ones as a count out of the lot. */
  size(value: number): string;
  /** A dial's value in its unit. */
  dial(letter: string, value: number): string;
  /** "about 8 times in 10", as a number of times. */
  timesInTen(share: number): string;
  settings(refs: FactRefs): string;
  terms(refs: FactRefs): string;
  /** "Jaw temp" for a setting, "Jaw temp + Dwell" for two that work together. */
  term(term: string): string;
  result(refs: FactRefs): string;
}

export function factSpeech(brief: Brief, t: FactTranslate, language: Language): FactSpeech {
  const { number, list } = formatsFor(language, 'UTC');
  const factorOf = (letter: string) => brief.factors[letter.charCodeAt(0) - 65];
  const nameOf = (letter: string) => factorOf(letter)?.name ?? letter;
  const term = (letters: string) => [...letters].map(nameOf).join(' + ');
  const withUnit = (value: string, unit: string) => (unit === '' ? value : `${value} ${unit}`);
  return {
    brief,
    t,
    number: (value) => number(value),
    size(value) {
      const { kind, lotSize, unit } = brief.response;
      if (kind !== 'rejects' || lotSize === undefined) {
        return withUnit(number(roundForPromise(value), 6), kind === 'measured' ? unit : '');
      }
      return t('outOf', { number: number(roundForPromise(value * lotSize)), lot: number(lotSize) });
    },
    dial(letter, value) {
      const factor = factorOf(letter);
      return withUnit(number(value), factor?.kind === 'number' ? factor.unit : '');
    },
    timesInTen: (share) => number(Math.min(9, Math.max(1, Math.round(share * 10)))),
    settings: ({ factors = [] }) => list(factors.map(nameOf)),
    terms: ({ terms = [] }) => list(terms.map(term)),
    term,
    result({ results: [place = 0] = [] }) {
      const result = place === 0 ? brief.response : brief.watch[place - 1];
      return result?.name ?? brief.response.name;
    },
  };
}
