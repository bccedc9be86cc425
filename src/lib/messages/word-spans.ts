import { foldWords } from './fold-words.ts';

/** A word of a text, folded, with where it stands in what was typed. */
export interface WordSpan {
  word: string;
  start: number;
  end: number;
}

/** The words of a text in the sense of `foldWords`, each with its place. */
export function listWords(text: string): WordSpan[] {
  return [...text.matchAll(/[\p{L}\p{N}\p{M}]+/gu)].flatMap((found) => {
    const word = foldWords(found[0]);
    return word === '' ? [] : [{ word, start: found.index, end: found.index + found[0].length }];
  });
}

/**
 * How many words at the start spell the phrase; spaces do not count, so that "boqua" and "can t" are read too.
 * @returns 0 where they do not
 */
export function matchPhrase(words: readonly { word: string }[], phrase: string): number {
  const wanted = phrase.replaceAll(' ', '');
  let spelt = '';
  for (const [place, { word }] of words.entries()) {
    spelt += word;
    if (spelt === wanted) return place + 1;
    if (!wanted.startsWith(spelt)) return 0;
  }
  return 0;
}

/**
 * Whether a word is a slip of the thumb for another: two neighbours swapped or a letter doubled; in words of six letters
 * and more also one letter lost, added or mistaken. Short words get no more leave, since "water" is not "later".
 */
export function isSlipOf(typed: string, wanted: string): boolean {
  if (typed === wanted || wanted.length < 4) return typed === wanted;
  if (isSwap(typed, wanted) || isDoubled(typed, wanted)) return true;
  return wanted.length >= 6 && isOneLetterOff(typed, wanted);
}

function firstDifference(one: string, other: string): number {
  let place = 0;
  while (place < one.length && one[place] === other[place]) place += 1;
  return place;
}

function isSwap(typed: string, wanted: string): boolean {
  if (typed.length !== wanted.length) return false;
  const at = firstDifference(typed, wanted);
  return (
    typed[at] === wanted[at + 1] &&
    typed[at + 1] === wanted[at] &&
    typed.slice(at + 2) === wanted.slice(at + 2)
  );
}

function isDoubled(typed: string, wanted: string): boolean {
  if (typed.length !== wanted.length + 1) return false;
  const at = firstDifference(typed, wanted);
  return typed[at] === typed[at - 1] && typed.slice(at + 1) === wanted.slice(at);
}

function isOneLetterOff(typed: string, wanted: string): boolean {
  const at = firstDifference(typed, wanted);
  if (typed.length === wanted.length) return typed.slice(at + 1) === wanted.slice(at + 1);
  if (typed.length === wanted.length + 1) return typed.slice(at + 1) === wanted.slice(at);
  return typed.length === wanted.length - 1 && typed.slice(at) === wanted.slice(at + 1);
}
