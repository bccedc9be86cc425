import { describe, expect, it } from 'vitest';
import { languages } from '../../i18n/languages.ts';
import { translatorFor } from '../../i18n/translator.ts';
import { designFacts } from '../../lib/doe/design/design-facts.ts';
import { type Brief, type Fact, proposePlans } from '../../lib/doe/index.ts';
import type { FactTranslate } from './fact-speech.ts';
import { planFactLines } from './fact-words.ts';

const wordsIn = (language: (typeof languages)[number]): FactTranslate => {
  const t = translatorFor(language) as (key: string, values?: object) => string;
  return ((key: string, values?: object) => t(`plan-facts:${key}`, values)) as FactTranslate;
};

const brief: Brief = {
  response: { name: 'seal strength', unit: 'N', kind: 'measured', goal: 'more', worthHaving: 3 },
  watch: [{ name: 'burnt edges', unit: '', kind: 'rejects', goal: 'less', lotSize: 50, usualRate: 0.04 }],
  factors: [
    { kind: 'number', name: 'Jaw temp', unit: 'C', low: 140, high: 160, usual: 150 },
    { kind: 'number', name: 'Dwell', unit: 's', low: 0.8, high: 1, usual: 0.8 },
    { kind: 'number', name: 'Pressure', unit: 'bar', low: 3, high: 4, usual: 3 },
    { kind: 'choice', name: 'Film', low: 'Supplier A', high: 'Supplier B', usual: 'low' },
  ],
  forbidden: [{ A: 1, B: 1 }],
  budget: { maxRuns: 12 },
  noise: { sd: 2, of: 'part' },
};

/** Any figure will do: what matters is that every kind is said. */
const figures: Record<string, number> = {
  power: 0.83,
  ratio: 2.34,
  rule: 0,
  lowestEfficiency: 0.8,
  expected: 2,
  lotNeeded: 125,
};

function sampleOf(schema: (typeof designFacts)[number]): Fact {
  const { kind, values } = schema.shape;
  const filled = Object.keys(values.shape).map((field) => [field, figures[field] ?? 4]);
  const refs = { factors: ['A', 'B'], terms: ['A', 'CD'], results: [1] };
  return schema.parse({ kind: kind.value, values: Object.fromEntries(filled), refs }) as Fact;
}

describe('the words for a plan', () => {
  it.each(languages)('say every fact about a plan in %s', (language) => {
    for (const schema of designFacts) {
      const fact = sampleOf(schema);
      const [line, ...others] = planFactLines([fact], brief, wordsIn(language), language);
      expect(others).toEqual([]);
      expect(line?.words, fact.kind).toBeTruthy();
      expect(line?.words, fact.kind).not.toMatch(/\{\{|warning\.|reason\.|NaN|undefined/);
    }
  });

  it('use the shop’s own names and units', () => {
    const facts: Fact[] = [
      { kind: 'pairs-tied', values: {}, refs: { terms: ['AB', 'CD'] } },
      { kind: 'setup-assumed', values: { setup: 1.02 }, refs: {} },
      { kind: 'narrow-a-range-first', values: { rule: 0, low: 140, high: 150 }, refs: { factors: ['A'] } },
    ];
    expect(planFactLines(facts, brief, wordsIn('en'), 'en').map(({ words }) => words)).toEqual([
      'Can’t tell apart, where they work together: Jaw temp + Dwell and Pressure + Film.',
      'We take it that setting the machine anew moves the result by about 1 N.',
      'Run Jaw temp from 140 to 150 C only, and you need no rule for that mix.',
    ]);
  });

  it('say bad ones as a count out of the lot', () => {
    const counted: Brief = {
      ...brief,
      response: { name: 'bad seals', unit: '', kind: 'rejects', goal: 'less', lotSize: 200 },
    };
    const fact: Fact = { kind: 'surer', values: { size: 0.03, recommendedSize: 0.05 }, refs: {} };
    expect(planFactLines([fact], counted, wordsIn('en'), 'en')[0]?.words).toBe(
      'Surer: it spots a change of 6 out of 200. The plan we would take spots 10 out of 200.',
    );
  });

  it('say nothing twice', () => {
    const [best] = proposePlans({ ...brief, forbidden: [], budget: { maxRuns: 16 } });
    const facts = best ? [...best.reasons, ...best.warnings] : [];
    const lines = planFactLines([...facts, ...facts], brief, wordsIn('pl'), 'pl');
    expect(lines.length).toBeGreaterThan(2);
    expect(new Set(lines.map(({ words }) => words)).size).toBe(lines.length);
  });
});
