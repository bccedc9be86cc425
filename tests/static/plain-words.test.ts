import { describe, expect, it } from 'vitest';
import { languages } from '../../src/i18n/languages.ts';
import { readLocales } from './locale-files.ts';
import { findAuditTerms } from './plain-words.ts';

const locales = readLocales();

describe('the words of supervisors and operators', () => {
  it.each(languages)('hold no term of the engineer (%s)', (language) => {
    expect(findAuditTerms(language, locales.get(language) ?? new Map())).toEqual([]);
  });

  it.each([
    ['en', 'The noise is large.'],
    ['es', 'La interacción de los ajustes'],
    ['pl', 'Odchylenie standardowe'],
    ['vi', 'Độ lệch chuẩn'],
  ] as const)('would be caught with one (%s)', (language, text) => {
    expect(findAuditTerms(language, new Map([['wizard:a', text]]))).toHaveLength(1);
    expect(findAuditTerms(language, new Map([['audit:a', text]]))).toEqual([]);
  });
});
