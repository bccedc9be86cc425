import { render, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { type CaseName, caseNames, verdictCase } from '../../../../tests/builders/verdict-cases.ts';
import { gradeOf, sentencesOf, withoutLabels } from '../../../../tests/static/sentences.ts';
import { formatsFor } from '../../../i18n/format.ts';
import { type Language, languages } from '../../../i18n/languages.ts';
import { translatorFor } from '../../../i18n/translator.ts';
import { bossWords } from './boss-words.ts';
import type { PageWording } from './page-wording.ts';
import { RunningBody } from './RunningBody.tsx';
import { VerdictBody } from './VerdictBody.tsx';
import { VerdictCard } from './VerdictCard.tsx';

function wordingOf(name: CaseName, language: Language): PageWording {
  return { view: verdictCase(name), t: translatorFor(language), formats: formatsFor(language, 'UTC') };
}

/** The engineer's words, which no supervisor's page may hold. */
const auditWords: Record<Language, RegExp> = {
  es: /(interacci|alias|valor p\b|significativ|varianza|residu|confianza|réplica|curvatura|coeficiente|desviaci|aleatori|atípic|bloque)/i,
  vi: /(nhân tố|tương tác|ý nghĩa thống kê|phương sai|phần dư|khoảng tin cậy|hệ số|độ lệch|ngẫu nhiên|ngoại lai)/i,
  en: /\b(factor|response|interaction|alias|confound|p-value|significan|anova|residual|confidence|replicate|curvature|coefficient|deviation|effects?\b(?= of)|randomi|main effect|noise|outlier|drift|block)/i,
  pl: /(czynnik|interakcj|istotn|ufności|wariancj|resztow|współczynnik|odchyleni|randomi|replik|p-warto|szum)/i,
};
const broken = /undefined|NaN|Infinity|null|\{\{|\}\}|verdict:|verdict-page:|safety:|\[object/;

describe.each(languages)('the page of a verdict in %s', (language) => {
  it.each(caseNames)('says all of "%s" in plain words', (name) => {
    const wording = wordingOf(name, language);
    const { container } = render(<VerdictBody {...wording} />);
    const text = container.textContent ?? '';
    expect(text).not.toMatch(broken);
    expect(text).not.toMatch(auditWords[language]);
    const heads = within(container)
      .getAllByRole('heading', { level: 2 })
      .map((head) => head.id);
    expect(heads.slice(0, 6)).toEqual([
      'what-to-set',
      'how-much-better',
      'can-you-trust',
      'if-it-goes-wrong',
      'tell-your-boss',
      'why-we-say-so',
    ]);
    expect(within(container).getByRole('heading', { level: 1 }).textContent).not.toBe('');
    for (const sentence of bossWords(wording)) expect(text).toContain(sentence);
  });

  it('gives every chart its figures as a table', () => {
    const { container } = render(<VerdictBody {...wordingOf('reversed', language)} />);
    expect(container.querySelectorAll('.pair-chart')).toHaveLength(1);
    expect(within(container).getAllByRole('table', { hidden: true })).toHaveLength(1);
  });

  it('names the settings to go back to on the card, whatever was decided', () => {
    const { container } = render(<VerdictCard {...wordingOf('strong', language)} />);
    expect(container.textContent).toContain('150 °C');
    expect(container.textContent).not.toMatch(broken);
  });
});

describe('while runs are out', () => {
  it('shows readings, and not one change of a setting', () => {
    const { view, t, formats } = wordingOf('oddReading', 'en');
    const facts = view.verdict.trust.filter(({ kind }) => kind === 'odd-reading');
    const { container } = render(<RunningBody view={{ ...view, facts }} t={t} formats={formats} />);
    expect(container.textContent).toContain('One reading looks odd: run 4');
    expect(container.textContent).not.toMatch(/higher|lower|Matters|Jaw temp/);
  });
});

it('puts "keep" on the card after check runs that fell short', () => {
  const { container } = render(<VerdictCard {...wordingOf('fellShort', 'en')} />);
  expect(container.querySelector('.job-tag-settings')?.textContent).toContain('150');
});

/** The blocks of text of a page, one a line, so that a sentence never runs into the next block. */
function linesOf(container: HTMLElement): string {
  const blocks = container.querySelectorAll('h1, p, li, blockquote');
  return [...blocks].map((block) => block.textContent ?? '').join('\n');
}

it.each(caseNames)('asks for no more than seven years of school to read "%s"', (name) => {
  const { container } = render(<VerdictBody {...wordingOf(name, 'en')} />);
  const said = withoutLabels(sentencesOf('en', new Map([['verdict:page', linesOf(container)]])));
  expect(said.length).toBeGreaterThan(8);
  expect(gradeOf(said)).toBeLessThanOrEqual(7);
});
