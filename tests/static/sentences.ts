import type { Words } from './locale-files.ts';

/** The longest a sentence may be, and the most that sentences may be on average, in words. */
export const limits = { longest: 25, average: 15, grade: 6 };

/** Namespaces of the engineer's pages, where the field's standard terms stand; all others are plain. */
const auditNamespaces = /^(audit(-.+)?|plan-review)$/;

export function isPlain(key: string): boolean {
  return !auditNamespaces.test(key.slice(0, key.indexOf(':')));
}

export interface Sentence {
  key: string;
  text: string;
  words: string[];
}

/** The sentences of a language. A placeholder counts as one word; a new line ends a sentence, as it does on a phone. */
export function sentencesOf(language: string, words: Words): Sentence[] {
  const segmenter = new Intl.Segmenter(language, { granularity: 'sentence' });
  return [...words].flatMap(([key, value]) => {
    const lines = value
      .replace(/\{\{[^}]*\}\}|\$t\([^)]*\)/g, 'Seven')
      .replace(/<[^>]*>/g, '')
      .split('\n');
    return lines.flatMap((line) =>
      [...segmenter.segment(line)]
        .map(({ segment }) => ({ key, text: segment.trim(), words: splitWords(segment) }))
        .filter((sentence) => sentence.words.length > 0),
    );
  });
}

function splitWords(text: string): string[] {
  return text.split(/[\s/–—]+/).filter((token) => /[\p{L}\p{N}]/u.test(token));
}

/** Sentences proper, in contrast to labels, which would make any average look short. */
export function withoutLabels(sentences: Sentence[]): Sentence[] {
  return sentences.filter(
    ({ text, words }) => words.length >= 6 || (words.length >= 3 && /[.?!…]["”»]?$/.test(text)),
  );
}

export function findTooLong(sentences: Sentence[]): string[] {
  return sentences
    .filter(({ words }) => words.length > limits.longest)
    .map(({ key, words, text }) => `${key}: ${words.length} words in "${text}"`);
}

export function averageLength(sentences: Sentence[]): number {
  return sum(sentences.map(({ words }) => words.length)) / sentences.length;
}

/**
 * The school grade that English text asks for: 0.39 words a sentence + 11.8 syllables a word - 15.59.
 * Source: J. P. Kincaid, R. P. Fishburne, R. L. Rogers, B. S. Chissom (1975), Derivation of new readability formulas for
 * Navy enlisted personnel, Research Branch Report 8-75.
 */
export function gradeOf(sentences: Sentence[]): number {
  const words = sentences.flatMap((sentence) => sentence.words);
  const syllables = sum(words.map(countSyllables));
  return 0.39 * averageLength(sentences) + 11.8 * (syllables / words.length) - 15.59;
}

/** Syllables of an English word by its groups of vowels, silent endings left out: right for most words, close for the rest. */
export function countSyllables(word: string): number {
  const letters = word.toLowerCase().replace(/[^a-z]/g, '');
  const spoken = letters.replace(/(?:[^laeiouygszxc]es|[^dtaeiouy]ed|[^laeiouy]e)$/, '').replace(/^y/, '');
  return Math.max(1, spoken.match(/[aeiouy]{1,2}/g)?.length ?? 0);
}

function sum(values: number[]): number {
  return values.reduce((total, value) => total + value, 0);
}
