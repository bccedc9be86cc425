import { foldWords } from './fold-words.ts';
import { fillerWords, usualUnits } from './reply-words.ts';

/** A number as it was typed, points and commas not yet understood. */
export interface TypedNumber {
  typed: string;
  /** What ties it to the next number: `3 of 50`, `3/50`. */
  tie: 'of' | 'slash' | null;
}

export interface NumberList {
  numbers: TypedNumber[];
  /** Something about the numbers has no sure meaning: a time, a span, a fraction, a letter grown into a figure. */
  isUnclear: boolean;
  /** A word that is neither a unit, a name of the result nor a filler. */
  hasOtherWords: boolean;
  /** A share is not a count. */
  hasPercent: boolean;
}

const ofWords = new Set(['of', 'de', 'z', 'ze', 'na', 'tren', 'trong']);
const unitPerNumber = /(?<=\d\s*)\p{L}{1,6}\s*\/\s*\d*\s*\p{L}{1,6}[23\u00b2\u00b3]?(?![\p{L}\d])/gu;
const token =
  /(?<number>[+-]?\d+(?:[.,]\d+)*)|(?<word>[\p{L}\p{M}]+)|(?<slash>[/\\])|(?<plain>[\s.,;:&!()[\]*#_="'%\u00b0]|\p{Extended_Pictographic}|\p{Sk}|\p{Cf}|\p{RI})|(?<other>.)/gsu;

/**
 * Lists the numbers of a text that says nothing but numbers.
 * @param names what the results and their units are called; such words may stand beside the numbers
 */
export function listNumbers(text: string, names: readonly string[]): NumberList {
  const known = new Set(names.flatMap((name) => foldWords(name).split(' ')));
  const cleared = text.replace(unitPerNumber, ' ');
  const list: NumberList = {
    numbers: [],
    isUnclear: false,
    hasOtherWords: false,
    hasPercent: cleared.includes('%'),
  };
  let before: 'number' | 'word' | 'sign' | 'space' = 'space';
  for (const found of cleared.matchAll(token)) {
    const { number, word, slash, other } = found.groups ?? {};
    const last = list.numbers.at(-1);
    if (number !== undefined) {
      const isSigned = /^[+-]/.test(number);
      const firstIsSigned = /^[+-]/.test(list.numbers[0]?.typed ?? number);
      const isGlued = before === 'word' || before === 'number' || (before === 'sign' && isSigned);
      if (isGlued || (isSigned && last && !firstIsSigned)) list.isUnclear = true;
      list.numbers.push({ typed: number.replace(/^\+/, ''), tie: null });
      before = 'number';
    } else if (word !== undefined) {
      const folded = foldWords(word);
      const mayBeUnit = last !== undefined && last.tie === null;
      if (ofWords.has(folded) && mayBeUnit) last.tie = 'of';
      else if (folded === 'out' && mayBeUnit) last.tie = null;
      else if (mayBeUnit && usualUnits.has(folded)) last.tie = null;
      else if (!known.has(folded) && !fillerWords.has(folded)) list.hasOtherWords = true;
      before = 'word';
    } else if (slash !== undefined) {
      if (last?.tie === null) last.tie = 'slash';
      else list.isUnclear = true;
      before = 'sign';
    } else if (other !== undefined) {
      list.isUnclear = true;
      before = 'sign';
    } else {
      // A sign glued between two figures (10:30, 1'234, 41..5) leaves open what they are.
      const isSpace = /[\s,;&([\]=]/u.test(found[0]);
      before = isSpace || before === 'space' ? 'space' : 'sign';
      const next = cleared[found.index + found[0].length] ?? ' ';
      const previous = cleared[found.index - 1] ?? ' ';
      if (/[:.'"_*]/.test(found[0]) && /\d/.test(next) && /[\d.,]/.test(previous)) list.isUnclear = true;
      if (found[0] === '.' && /\d/.test(next)) list.isUnclear = true;
      if (found[0] === ',' && /[.,]/.test(next)) list.isUnclear = true;
    }
  }
  if (list.numbers.at(-1)?.tie) list.isUnclear = true;
  return list;
}
