import type { FactorSpec, NumberFactor } from '../../lib/doe/index.ts';
import type { Wording } from './wording.ts';

/** Dials have few decimals; more come from arithmetic alone. */
const DIAL_DIGITS = 6;

export function placeOf(letter: string): number {
  return letter.charCodeAt(0) - 65;
}

function factorOf({ view }: Pick<Wording, 'view'>, letter: string): FactorSpec {
  const factor = view.brief.factors[placeOf(letter)];
  if (factor === undefined) throw new RangeError(`factorOf: the brief has no setting ${letter}`);
  return factor;
}

export function isChoice(wording: Pick<Wording, 'view'>, letter: string): boolean {
  return factorOf(wording, letter).kind === 'choice';
}

/** What a setting stands at: "158 °C", "Supplier B". */
export function sayValue({ t, formats, view }: Wording, letter: string, value: number | string): string {
  const factor = factorOf({ view }, letter);
  if (typeof value === 'string') return value;
  const number = formats.number(value, DIAL_DIGITS);
  return factor.kind === 'choice' || factor.unit === ''
    ? number
    : t('verdict:figure.measured', { number, unit: factor.unit });
}

/** Its value at low or high. */
export function sayEnd(wording: Wording, letter: string, level: number): string {
  const factor = factorOf(wording, letter);
  return sayValue(wording, letter, level < 0 ? factor.low : factor.high);
}

export function settingName(wording: Pick<Wording, 'view'>, letter: string): string {
  return factorOf(wording, letter).name;
}

/** "Jaw temp", or "Jaw temp and Dwell together" for a pair. */
export function termName(wording: Wording, term: string): string {
  const names = [...term].map((letter) => settingName(wording, letter));
  const [only = ''] = names;
  return names.length < 2
    ? only
    : wording.t('verdict:setting.together', { settings: wording.formats.list(names) });
}

/** "140 to 160 °C" */
export function sayRange({ t, formats }: Wording, factor: NumberFactor): string {
  const [from, to] = [factor.low, factor.high].map((end) => formats.number(end, DIAL_DIGITS));
  const ends = { from: from ?? '', to: to ?? '' };
  return factor.unit === ''
    ? t('verdict:range.bare', ends)
    : t('verdict:range.measured', { ...ends, unit: factor.unit });
}

/** What was changed: "Jaw temp 140 to 160 °C", "Film: Supplier A or Supplier B", "Jaw temp and Dwell together". */
export function changeName(wording: Wording, term: string): string {
  if (term.length > 1) return termName(wording, term);
  const factor = factorOf(wording, term);
  return factor.kind === 'number'
    ? wording.t('verdict:setting.numbers', { setting: factor.name, range: sayRange(wording, factor) })
    : wording.t('verdict:setting.choice', { setting: factor.name, low: factor.low, high: factor.high });
}

/** "Jaw temp at 160 °C" */
export function settingAt(wording: Wording, letter: string, level: number): string {
  return wording.t('verdict:setting.at', {
    setting: settingName(wording, letter),
    value: sayEnd(wording, letter, level),
  });
}

/** Terms by their names, each a phrase with an "and" of its own: so no further "and" between them. */
export function listTerms(wording: Wording, terms: readonly string[]): string {
  return terms.map((term) => termName(wording, term)).join('; ');
}

export function listSettings(wording: Wording, letters: readonly string[]): string {
  return wording.formats.list(letters.map((letter) => settingName(wording, letter)));
}
