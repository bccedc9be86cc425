import { septetsOfLetter } from './gsm-alphabet.ts';
import {
  plainLettersByLanguage,
  plainSigns,
  plainSpecialLetters,
  type TextLanguage,
} from './plain-letter-tables.ts';

const combiningMarks = /\p{Mn}/gu;

/**
 * A text in plain letters: only the seven-bit alphabet, so that a segment holds 160 letters and not 70.
 * Accents go by the language's table, then by what the alphabet lacks; typographic signs become typed ones.
 * A letter for which there is no plain one (another script, an emoji) stays as it is: a wrong letter would be worse
 * than a dearer text, and `countSegments` shows the cost.
 * @param text any text
 * @param language the reader's language
 */
export function toPlainLetters(text: string, language: TextLanguage): string {
  const ownTable = plainLettersByLanguage[language];
  let plain = '';
  for (const letter of text.normalize('NFC')) {
    const sign = plainSigns.get(letter);
    // "1½" must not read "11/2", but a lone "½" needs no space before it.
    if (sign !== undefined) plain += /\d$/.test(plain) ? sign : sign.trimStart() || sign;
    else plain += ownTable.get(letter) ?? toSevenBitLetter(letter);
  }
  return plain;
}

function toSevenBitLetter(letter: string): string {
  if (septetsOfLetter(letter) !== undefined) return letter;
  const special = plainSpecialLetters.get(letter);
  if (special !== undefined) return special;
  const base = letter.normalize('NFD').replace(combiningMarks, '');
  if (base === letter) return letter;
  const plainBase = plainSpecialLetters.get(base) ?? base;
  return [...plainBase].every((part) => septetsOfLetter(part) !== undefined) ? plainBase : letter;
}
