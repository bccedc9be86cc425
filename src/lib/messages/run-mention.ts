import { runWords } from './reply-words.ts';
import { listWords, matchPhrase } from './word-spans.ts';

/** A text with the run it names taken out of it. */
export interface RunMention {
  run: number | undefined;
  rest: string;
}

const runNumber = /^\d{1,3}$/;
const gluedRun = new RegExp(`^(?:${runWords.filter((word) => !word.includes(' ')).join('|')})(\\d{1,3})$`);

/**
 * Finds the run that a text names: `run 3 41.5`, `3: 41.5`, `41.5 run 3`. A bare number is never a run.
 */
export function findRunMention(text: string): RunMention {
  return leadingRun(text) ?? trailingRun(text) ?? { run: undefined, rest: text };
}

/** A number that may be a run's: alone, and not the whole part of a decimal, of a time or of `3/50`. */
function isWholeNumber(text: string, word: { word: string; end: number }): boolean {
  return runNumber.test(word.word) && !/^(?:[.,:/\\]\s*\d|-\d)/.test(text.slice(word.end));
}

function leadingRun(text: string): RunMention | undefined {
  const words = listWords(text);
  const [first] = words;
  if (!first) return undefined;
  const behind = (end: number) =>
    text
      .slice(end)
      .replace(/^\s*[:;.,)=-]*\s+|^\s*[:)=]\s*/u, '')
      .trim();
  // `3: 41.5` and `3) 41.5`, but not 10:30, which may be a time.
  const marked = /^\s*#?\s*(\d{1,3})\s*(?::\s+|:(?=\s*\d+[.,]\d)|\)\s*|:\s*$|:(?=\s*\p{L}))/u.exec(text);
  if (marked) return { run: Number(marked[1]), rest: text.slice(marked[0].length).trim() };
  const glued = gluedRun.exec(first.word);
  if (glued && !/^[.,:/\\]\s*\d/.test(text.slice(first.end))) {
    return { run: Number(glued[1]), rest: behind(first.end) };
  }
  for (const phrase of runWords) {
    const length = matchPhrase(words, phrase);
    const number = words[length];
    const colon = number ? /^:\s*\d/.test(text.slice(number.end)) : false;
    if (length > 0 && number && runNumber.test(number.word)) {
      if (isWholeNumber(text, number) || colon) return { run: Number(number.word), rest: behind(number.end) };
    }
  }
  return undefined;
}

function trailingRun(text: string): RunMention | undefined {
  const words = listWords(text);
  const last = words.at(-1);
  if (!last || text.slice(last.end).search(/\S/) > 0) return undefined;
  const glued = gluedRun.exec(last.word);
  if (glued && words.length > 1) return { run: Number(glued[1]), rest: text.slice(0, last.start).trim() };
  if (!isWholeNumber(text, last) || /[\d][.,]$/.test(text.slice(0, last.start))) return undefined;
  for (const phrase of [...runWords].sort((one, other) => other.length - one.length)) {
    const length = phrase.split(' ').length;
    const start = words.length - 1 - length;
    if (start < 1 || phrase === 'r') continue;
    const begin = words[start];
    if (begin && matchPhrase(words.slice(start, -1), phrase) === length) {
      return { run: Number(last.word), rest: text.slice(0, begin.start).trim() };
    }
  }
  return undefined;
}

/**
 * Reads the answer to "which run": one of the numbers that were offered, alone or with the word for a run.
 * @returns undefined for anything else
 */
export function readRunChoice(text: string, offered: readonly number[]): number | undefined {
  const words = listWords(text).map(({ word }) => word);
  const number = words.at(-1) ?? '';
  const isAlone = words.length === 1 || (words.length === 2 && runWords.includes(words[0] ?? ''));
  const glued = words.length === 1 ? gluedRun.exec(number)?.[1] : undefined;
  const run = Number(glued ?? number);
  return isAlone && /^\d{1,3}$/.test(glued ?? number) && offered.includes(run) ? run : undefined;
}
