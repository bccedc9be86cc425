import { describe, expect, it } from 'vitest';
import { languages } from '../../src/i18n/languages.ts';
import { readLocales } from './locale-files.ts';
import {
  averageLength,
  countSyllables,
  findTooLong,
  gradeOf,
  isPlain,
  limits,
  sentencesOf,
  withoutLabels,
} from './sentences.ts';

const locales = readLocales();

function sentencesIn(language: string) {
  return sentencesOf(language, locales.get(language) ?? new Map());
}

describe.each(languages)('what is written in %s', (language) => {
  it('has no sentence that is too long', () => {
    expect(findTooLong(sentencesIn(language))).toEqual([]);
  });

  it('has short sentences on average', () => {
    const sentences = withoutLabels(sentencesIn(language));
    expect(sentences.length).toBeGreaterThan(10);
    expect(averageLength(sentences)).toBeLessThanOrEqual(limits.average);
  });
});

const pageOf = ({ key }: { key: string }) => key.slice(0, key.indexOf(':'));
const plain = withoutLabels(sentencesIn('en')).filter(({ key }) => isPlain(key));
const plainPages = [...new Set(plain.map(pageOf))].map(
  (page) => [page, plain.filter((sentence) => pageOf(sentence) === page)] as const,
);

it.each(plainPages)('the plain English of %s can be read after six years of school', (_page, sentences) => {
  expect(gradeOf(sentences)).toBeLessThanOrEqual(limits.grade);
});

function sentencesOfText(text: string) {
  return sentencesOf('en', new Map([['trial:key', text]]));
}

describe('the measures', () => {
  it('take sentences apart at full stops and new lines', () => {
    const found = sentencesOfText('Run 3 is next.\nPlease set {{setting}} to 4.5 now! Jaw 1').map(
      ({ text }) => text,
    );
    expect(found).toEqual(['Run 3 is next.', 'Please set Seven to 4.5 now!', 'Jaw 1']);
  });

  it('leave labels out of averages', () => {
    expect(withoutLabels(sentencesOfText('Set the jaw.\nJaw 1\nNo.')).map(({ text }) => text)).toEqual([
      'Set the jaw.',
    ]);
  });

  it('find a sentence of 26 words', () => {
    expect(findTooLong(sentencesOfText(`${'word '.repeat(25)}end.`))).toHaveLength(1);
    expect(findTooLong(sentencesOfText(`${'word '.repeat(24)}end.`))).toEqual([]);
  });

  it('rate officialese far above the limit, and plain words below it', () => {
    const heavy =
      'Notwithstanding contradictory preliminary evaluations, operational personnel acknowledge considerable variability.';
    expect(gradeOf(sentencesOfText(heavy))).toBeGreaterThan(15);
    expect(gradeOf(sentencesOfText('Set the jaw to ten. Make six parts, then text the mean.'))).toBeLessThan(
      3,
    );
  });

  it.each(
    Object.entries({
      jaw: 1,
      set: 1,
      make: 1,
      made: 1,
      parts: 1,
      changed: 1,
      closes: 2,
      wanted: 2,
      pages: 2,
      table: 2,
      setting: 2,
      reading: 2,
      trial: 2,
      supervisor: 4,
      operator: 4,
      engineer: 3,
      temperature: 4,
      machine: 2,
      people: 2,
      yes: 1,
      measured: 2,
      tested: 2,
      difference: 3,
      safety: 3,
      answer: 2,
      nothing: 2,
      possible: 3,
    }),
  )('count the syllables of "%s": %i, off by one at most', (word, syllables) => {
    expect(Math.abs(countSyllables(word) - syllables)).toBeLessThanOrEqual(1);
  });
});
