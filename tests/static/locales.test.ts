import { describe, expect, it } from 'vitest';
import { languages } from '../../src/i18n/languages.ts';
import { namespaces } from '../../src/i18n/namespaces.ts';
import { findKeyFaults, findUntranslated } from './locale-faults.ts';
import { flatten, placeholdersOf, readLocales, type Words } from './locale-files.ts';
import { sameWords } from './same-words.ts';

const locales = readLocales();
const english: Words = locales.get('en') ?? new Map();
const others = languages.filter((language) => language !== 'en');

function wordsOf(language: string): Words {
  return locales.get(language) ?? new Map();
}

function words(entries: Record<string, string>): Words {
  return new Map(Object.entries(entries));
}

describe('the files in locales/', () => {
  it('are those of the languages of the product', () => {
    expect([...locales.keys()].sort()).toEqual([...languages].sort());
    expect(english.size).toBeGreaterThan(0);
  });

  it('are those of the namespaces of the product', () => {
    const found = new Set([...english.keys()].map((key) => key.slice(0, key.indexOf(':'))));
    expect([...found].filter((name) => !namespaces.some((known) => known === name))).toEqual([]);
  });

  it.each(languages)('have the same keys, plural forms and placeholders in %s', (language) => {
    expect(findKeyFaults(language, english, wordsOf(language))).toEqual([]);
  });

  it.each(others)('leave nothing untranslated in %s', (language) => {
    expect(findUntranslated(language, english, wordsOf(language), sameWords)).toEqual([]);
  });

  it('have no list entry for a key that is gone', () => {
    expect(Object.keys(sameWords).filter((key) => !english.has(key))).toEqual([]);
  });
});

describe('findKeyFaults', () => {
  const original = words({
    'trial:title': 'Trial {{number}}',
    'trial:runs_one': '{{count}} run',
    'trial:runs_other': '{{count}} runs',
  });
  const polish = {
    'trial:title': 'Próba {{number}}',
    'trial:runs_one': 'jeden przebieg',
    'trial:runs_few': '{{count}} przebiegi',
    'trial:runs_many': '{{count}} przebiegów',
    'trial:runs_other': '{{count}} przebiegu',
  };

  it('lets a whole translation be', () => {
    expect(findKeyFaults('pl', original, words(polish))).toEqual([]);
  });

  it.each([
    ['a missing key', 'trial:title', undefined],
    ['a missing plural form', 'trial:runs_few', undefined],
    ['a key too many', 'trial:extra', 'Więcej'],
    ['a placeholder left out', 'trial:title', 'Próba'],
    ['another placeholder', 'trial:title', 'Próba {{name}}'],
    ['a number left out of a form for many', 'trial:runs_many', 'przebiegów'],
    ['nothing but space', 'trial:title', ' '],
  ])('finds %s', (_case, key, text) => {
    const changed = words(polish);
    if (text === undefined) changed.delete(key);
    else changed.set(key, text);
    expect(findKeyFaults('pl', original, changed).length).toBeGreaterThan(0);
  });

  it('finds an English plural without its form for one', () => {
    const changed = words(Object.fromEntries(original));
    changed.delete('trial:runs_one');
    expect(findKeyFaults('en', changed, changed)).toEqual(['en: trial:runs_one is missing']);
  });
});

describe('findUntranslated', () => {
  const original = words({ 'trial:title': 'Trial', 'trial:unit': '{{value}} %' });

  it('finds a text left in English', () => {
    const spanish = words({ 'trial:title': 'Trial', 'trial:unit': '{{value}} %' });
    expect(findUntranslated('es', original, spanish, {})).toEqual(['es: trial:title is still English']);
  });

  it('finds a list entry that is no longer true', () => {
    const spanish = words({ 'trial:title': 'Prueba', 'trial:unit': '{{value}} %' });
    const same = { 'trial:title': ['es'] };
    expect(findUntranslated('es', original, spanish, same)).toHaveLength(1);
    expect(
      findUntranslated('pl', original, words({ 'trial:title': 'Trial' }), { 'trial:title': ['pl'] }),
    ).toEqual([]);
  });
});

describe('reading words', () => {
  it('finds placeholders, tags and nested keys, each once', () => {
    expect(placeholdersOf('{{a}} <1>b</1> {{- c}} {{n, number}} {{a}} $t(common:x)')).toEqual([
      '$t(common:x)',
      '</1>',
      '<1>',
      '{{a}}',
      '{{c}}',
      '{{n}}',
    ]);
  });

  it('refuses what is neither words nor an object of words', () => {
    expect(() => flatten('a:', { b: 1 })).toThrow(RangeError);
    expect(flatten('a:', { b: { c: 'd' }, e: 'f' })).toEqual([
      ['a:b.c', 'd'],
      ['a:e', 'f'],
    ]);
  });
});
