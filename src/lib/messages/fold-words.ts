import { plainSpecialLetters } from './plain-letter-tables.ts';

/**
 * What somebody typed, made comparable: lower case, accents and punctuation gone, single spaces.
 * "¡Sí!" becomes "si", "Đồng ý." becomes "dong y".
 */
export function foldWords(text: string): string {
  const letters = [...text.normalize('NFD').replace(/\p{Mn}/gu, '')];
  return letters
    .map((letter) => plainSpecialLetters.get(letter) ?? letter)
    .join('')
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .trim();
}
