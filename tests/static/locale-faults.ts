import { baseOf, categoryOf, placeholdersOf, type Words } from './locale-files.ts';

/** Each way in which a language differs from English in its keys, plural forms or placeholders. */
export function findKeyFaults(language: string, english: Words, words: Words): string[] {
  const wanted = expectedKeys(language, english);
  const missing = [...wanted].filter((key) => !words.has(key));
  const surplus = [...words.keys()].filter((key) => !wanted.has(key));
  const unequal = [...words].filter(
    ([key, text]) => wanted.has(key) && !hasSamePlaceholders(key, text, english),
  );
  return [
    ...missing.map((key) => `${language}: ${key} is missing`),
    ...surplus.map((key) => `${language}: ${key} is not asked for`),
    ...unequal.map(([key]) => `${language}: ${key} has other placeholders than English`),
    ...[...words].filter(([, text]) => text.trim() === '').map(([key]) => `${language}: ${key} is empty`),
  ];
}

/** The English keys, each plural one in the forms that the language has. */
function expectedKeys(language: string, english: Words): Set<string> {
  return new Set(
    [...english.keys()].flatMap((key) => {
      const category = categoryOf(key);
      if (!category) return [key];
      const type = key.includes('_ordinal_') ? 'ordinal' : 'cardinal';
      const { pluralCategories } = new Intl.PluralRules(language, { type }).resolvedOptions();
      return pluralCategories.map((form) => key.replace(new RegExp(`${category}$`), form));
    }),
  );
}

/** A plural form for one may leave the number out; every other text names exactly what the English one names. */
function hasSamePlaceholders(key: string, text: string, english: Words): boolean {
  const category = categoryOf(key);
  const original = english.get(key) ?? english.get(`${baseOf(key)}_other`) ?? '';
  const reference = category
    ? (english.get(key.replace(new RegExp(`${category}$`), 'other')) ?? original)
    : original;
  const found = new Set(placeholdersOf(text));
  const wanted = placeholdersOf(reference);
  const mayLackCount = category === 'one' || category === 'zero';
  const hasAll = wanted.every((name) => found.has(name) || (mayLackCount && name === '{{count}}'));
  return hasAll && [...found].every((name) => wanted.includes(name));
}

/** Words that are the same in another language, by key: the languages in which they are. */
export type SameWords = Record<string, string[]>;

/** Each text left in English, and each entry of the list of same words that is no longer true. */
export function findUntranslated(language: string, english: Words, words: Words, same: SameWords): string[] {
  const equal = [...words]
    .filter(([key, text]) => english.get(key) === text && hasLetters(text))
    .map(([key]) => key);
  const listed = Object.entries(same).flatMap(([key, languages]) =>
    languages.includes(language) ? [key] : [],
  );
  return [
    ...equal.filter((key) => !listed.includes(key)).map((key) => `${language}: ${key} is still English`),
    ...listed
      .filter((key) => !equal.includes(key))
      .map((key) => `${language}: ${key} is listed as the same, and is not`),
  ];
}

function hasLetters(text: string): boolean {
  return /\p{L}/u.test(text.replace(/\{\{[^}]*\}\}|<[^>]*>|\$t\([^)]*\)/g, ''));
}
