/** Languages the product speaks. */
export type TextLanguage = 'en' | 'es' | 'pl' | 'vi';

/** Pairs two strings letter by letter. */
function pair(from: string, to: string): [string, string][] {
  const targets = [...to];
  return [...from].map((letter, place) => [letter, targets[place] ?? '']);
}

/** Signs that stand for something typed on any keyboard. Same in every language. */
export const plainSigns: ReadonlyMap<string, string> = new Map([
  // Dashes and the typographic minus.
  ...pair('\u2010\u2011\u2012\u2013\u2014\u2015\u2212\u2043', '--------'),
  // Quotation marks, primes, accents that stand alone.
  ...pair('\u2018\u2019\u201a\u201b\u2032\u00b4\u0060\u2039\u203a', "'''''''''"),
  ...pair('\u201c\u201d\u201e\u201f\u2033\u00ab\u00bb', '"""""""'),
  // Spaces that do not break or have a width of their own; Intl writes U+00A0 and U+202F into numbers.
  ...pair(
    '\u00a0\u202f\u2000\u2001\u2002\u2003\u2004\u2005\u2006\u2007\u2008\u2009\u200a\u205f\u3000\t',
    ' '.repeat(16),
  ),
  // Signs without a width.
  ...[...'\u200b\u200c\u200d\u2060\ufeff\u00ad'].map((sign): [string, string] => [sign, '']),
  ['\u2026', '...'],
  ['\u2022', '*'],
  ['\u00b7', '.'],
  ['\u00d7', 'x'],
  ['\u00f7', '/'],
  ['\u2044', '/'],
  ['\u00b1', '+/-'],
  ['\u2264', '<='],
  ['\u2265', '>='],
  ['\u2248', '~'],
  ['\u2192', '->'],
  ['\u00b5', 'u'],
  ['\u03bc', 'u'],
  // The degree sign goes: "160 °C" reads 160 C. A raised figure keeps a mark, or 10² would read 102.
  ['\u00b0', ''],
  ['\u00b2', '^2'],
  ['\u00b3', '^3'],
  ['\u00bd', ' 1/2'],
  ['\u00bc', ' 1/4'],
  ['\u00be', ' 3/4'],
]);

/** Letters that do not come apart into a base letter and a mark. Same in every language: names travel. */
export const plainSpecialLetters: ReadonlyMap<string, string> = new Map([
  ...pair('łŁđĐðÐħĦıŧŦ', 'lLdDdDhHitT'),
  ['œ', 'oe'],
  ['Œ', 'OE'],
  ['þ', 'th'],
  ['Þ', 'Th'],
]);

/**
 * Letters that the seven-bit alphabet holds but a language's plain spelling drops all the same, because it drops the
 * others of their kind: Spanish keeps é but not á, Vietnamese keeps à but not ả, and a half-marked text reads worse
 * than an unmarked one. Spanish ñ, ü, ¿ and ¡ stay: without them words turn into other words.
 */
export const plainLettersByLanguage: Readonly<Record<TextLanguage, ReadonlyMap<string, string>>> = {
  en: new Map(),
  es: new Map(pair('áéíóúÁÉÍÓÚ', 'aeiouAEIOU')),
  pl: new Map(pair('ąćęłńóśźżĄĆĘŁŃÓŚŹŻ', 'acelnoszzACELNOSZZ')),
  vi: new Map(pair('àèéìòùÀÈÉÌÒÙ', 'aeeiouAEEIOU')),
};
