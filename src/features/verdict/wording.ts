import type { Formats } from '../../i18n/format.ts';
import type { Translate } from '../../i18n/translator.ts';
import type { VerdictView } from './verdict-view.ts';

/** What is spoken about, as far as single facts need it. */
export type Spoken = Pick<VerdictView, 'brief' | 'panelNames' | 'runs'>;

/** What it takes to put facts into words: the shop's own names, a language, and how its readers write numbers. */
export interface Wording {
  view: Spoken;
  t: Translate;
  formats: Formats;
}

/** A sentence may begin with a name that was typed in small letters. */
export function capitalize(words: string): string {
  const [first = '', ...rest] = words;
  return `${first.toLocaleUpperCase()}${rest.join('')}`;
}

/** One list of sentences as one text; each sentence stands for itself. */
export function sentences(parts: readonly (string | null)[]): string {
  return parts.filter((part) => part !== null && part !== '').join(' ');
}

/** "about 8 times in 10" */
export function sayChance({ t }: Wording, chance: number): string {
  const count = Math.round(chance * 10);
  if (count < 1) return t('verdict:chance.few');
  return count > 9 ? t('verdict:chance.most') : t('verdict:chance.about', { count });
}

/** "run 4", "runs 4, 7 and 9"; null: nobody knows which. */
export function sayRuns({ t, formats, view }: Wording, places: readonly number[]): string {
  const numbers = places
    .flatMap((place) => view.runs[place]?.number ?? [])
    .map((number) => formats.number(number));
  return t('verdict:runs', { count: Math.max(1, numbers.length), numbers: formats.list(numbers) });
}
