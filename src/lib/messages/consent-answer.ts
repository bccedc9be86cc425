import { foldWords } from './fold-words.ts';
import type { TextLanguage } from './plain-letter-tables.ts';

const yesWords: Readonly<Record<TextLanguage, readonly string[]>> = {
  en: ['ok', 'o k', 'okay', 'yes', 'yes ok', 'ok yes'],
  es: ['si', 'vale', 'de acuerdo', 'si ok', 'ok si', 'acepto', 'okey'],
  pl: ['tak', 'zgoda', 'okej', 'oki', 'dobrze', 'zgadzam sie', 'tak ok', 'ok tak'],
  vi: ['co', 'dong y', 'duoc', 'vang', 'da', 'da co', 'da vang', 'ok a'],
};

const noWords: readonly string[] = [
  'no',
  'nie',
  'khong',
  'no thanks',
  'no thank you',
  'no gracias',
  'nie dziekuje',
];

/** Unmarked Vietnamese words that mean something else in Polish ("co" asks "what?", "da" is "will give"). */
const ambiguousWithoutMarks = new Set(['co', 'da']);
const markedVietnameseYes = new Set(['có', 'dạ']);

/**
 * Reads the answer to the consent question: OK and its like, in all four languages at once, marks optional.
 * Only a whole text counts, for consent is never guessed out of a sentence.
 * @param text what came in
 * @param language the person's language; decides the words that mean different things in two languages
 * @returns undefined where it is neither, which leaves the question open
 */
export function readConsentAnswer(text: string, language: TextLanguage): 'yes' | 'no' | undefined {
  const words = foldWords(text);
  if (noWords.includes(words)) return 'no';
  const isYes = Object.values(yesWords).some((list) => list.includes(words));
  if (!isYes) return undefined;
  if (!ambiguousWithoutMarks.has(words) || language === 'vi') return 'yes';
  const typed = text
    .normalize('NFC')
    .toLowerCase()
    .replace(/[^\p{L}]/gu, '');
  return markedVietnameseYes.has(typed) ? 'yes' : undefined;
}
