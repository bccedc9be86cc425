import { describe, expect, it } from 'vitest';
import { everyAdviceFact, sampleCounts, sampleFigures } from '../../../tests/builders/every-advice-fact.ts';
import { caseNames, verdictCase } from '../../../tests/builders/verdict-cases.ts';
import { formatsFor } from '../../i18n/format.ts';
import { type Language, languages } from '../../i18n/languages.ts';
import { translatorFor } from '../../i18n/translator.ts';
import type { HeadlineWording } from './headline-words.ts';
import { sayFact } from './verdict-words.ts';

function wordingIn(language: Language, name: 'strong' | 'rejects' = 'strong'): HeadlineWording {
  return { view: verdictCase(name), t: translatorFor(language), formats: formatsFor(language, 'UTC') };
}

/** What no sentence may hold: a key, a placeholder, a number that is none. */
const broken = /undefined|NaN|Infinity|null|\{\{|\}\}|verdict:|\$t|\[object/;

const samples = Object.values(sampleFigures).flatMap((figure) => {
  const intervals = Math.abs(figure) === 6.2 ? (['none', 'apart', 'around'] as const) : (['apart'] as const);
  return intervals.map((interval, index) => ({ figure, interval, count: sampleCounts[index] ?? 22 }));
});

describe.each(languages)('every fact of a verdict in %s', (language) => {
  it.each(['strong', 'rejects'] as const)('is said whole, of the trial "%s"', (name) => {
    const wording = wordingIn(language, name);
    const facts = [...samples, { figure: 6.2, interval: 'apart' as const, count: 22 }].flatMap(
      everyAdviceFact,
    );
    for (const fact of facts) {
      const words = sayFact({ ...fact, refs: clip(fact.refs, wording) }, wording);
      expect(words, `${fact.kind} ${JSON.stringify(fact.values)}`).not.toMatch(broken);
      expect(words.trim(), fact.kind).not.toBe('');
      expect(words, fact.kind).not.toMatch(/ {2}|\.\.| [.,]|\(\)/);
    }
  });

  it('names no figure of the result without its unit', () => {
    const wording = wordingIn(language);
    // Counts and numbers of runs have none, nor has the 10 of "times in 10".
    const bare = /^(?:22|44|11|10|9|1|2)$/;
    for (const fact of everyAdviceFact({ figure: 6.2, interval: 'apart', count: 22 })) {
      if (fact.kind === 'steadier-matters' || fact.refs.results?.[0] === 1) continue;
      const words = sayFact(fact, wording)
        .replace(/\d[\d.,]* (?:to|a|do|đến) \d[\d.,]* (?:N|°C|s|bar)/g, '')
        .replace(/\d[\d.,]* (?:N|°C|s|bar)/g, '');
      const numbers = words.match(/\d[\d.,]*\d|\d/g) ?? [];
      expect(
        numbers.filter((number) => !bare.test(number)),
        `${fact.kind}: ${words}`,
      ).toEqual([]);
    }
  });
});

/** The trial of rejects watches nothing. */
function clip<Refs extends { results?: number[] }>(refs: Refs, { view }: HeadlineWording): Refs {
  return view.brief.watch.length > 0 || refs.results === undefined ? refs : { ...refs, results: [0] };
}

describe('what the trials say', () => {
  it.each(caseNames)('in English of "%s"', (name) => {
    const wording = { ...wordingIn('en'), view: verdictCase(name) };
    const { verdict, bet, confirmation } = wording.view;
    const facts = [
      verdict.headline,
      ...verdict.settings,
      ...verdict.pairs,
      ...verdict.details,
      ...verdict.trust,
      ...verdict.watched,
      ...verdict.steadier,
      ...verdict.cannotTell,
      ...verdict.next,
      ...bet.reasons,
      ...(confirmation?.facts ?? []),
    ];
    const said = facts.map((fact) => sayFact(fact, wording));
    expect(said.join('\n')).not.toMatch(broken);
  });
});
