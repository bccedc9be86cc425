import type { Letter } from '../brief.ts';

/** A product of settings as a set of bits: bit 0 is A, bit 1 is B, … Multiplying two words is their exclusive or, as every setting squared is 1. */
export type Word = number;

const firstLetter = 'A'.charCodeAt(0);

/** The letter of the setting at an index from 0. */
export function letterAt(index: number): Letter {
  return String.fromCharCode(firstLetter + index);
}

/** The word of one setting, by its index from 0. */
export function wordOf(index: number): Word {
  return 1 << index;
}

/** The letters of k settings: 'A', 'B', … */
export function lettersUpTo(k: number): Letter[] {
  return Array.from({ length: k }, (_, index) => letterAt(index));
}

/**
 * Reads 'ACE' as a word.
 *
 * @throws RangeError when the text holds anything but capital letters.
 */
export function readWord(text: string): Word {
  let word = 0;
  for (const letter of text) {
    const index = letter.charCodeAt(0) - firstLetter;
    if (index < 0 || index > 25) throw new RangeError(`readWord: text must be capital letters, got ${text}`);
    word ^= 1 << index;
  }
  return word;
}

/** Writes a word with its letters in order. */
export function writeWord(word: Word): string {
  let text = '';
  for (let index = 0; word >> index > 0; index++) if ((word >> index) & 1) text += letterAt(index);
  return text;
}

/** Number of letters. */
export function lengthOfWord(word: Word): number {
  let length = 0;
  for (let rest = word; rest > 0; rest &= rest - 1) length++;
  return length;
}

/** Shorter words first, then alphabetically. */
export function compareWords(first: Word, second: Word): number {
  const byLength = lengthOfWord(first) - lengthOfWord(second);
  if (byLength !== 0 || first === second) return byLength;
  // Alphabetically, the word that owns the first letter in which they differ comes first.
  const difference = first ^ second;
  return first & (difference & -difference) ? -1 : 1;
}

/** All products of the given words, the empty word included: 2 to the number of independent ones. */
export function spanWords(words: readonly Word[]): Set<Word> {
  const span = new Set<Word>([0]);
  for (const word of words) for (const member of [...span]) span.add(member ^ word);
  return span;
}
