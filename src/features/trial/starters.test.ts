import { describe, expect, it } from 'vitest';
import { languages } from '../../i18n/languages.ts';
import { translatorFor } from '../../i18n/translator.ts';
import { proposePlans } from '../../lib/doe/index.ts';
import { starterNames } from './answer-choices.ts';
import { readFinished } from './answer-problem.ts';
import { questionSchemas } from './answers.schema.ts';
import type { StarterWords } from './starters/starter.ts';
import { starterAnswers } from './starters.ts';
import { toBrief } from './to-brief.ts';

const wordsIn = (language: (typeof languages)[number]): StarterWords => {
  const t = translatorFor(language) as (key: string) => string;
  return ((key: string) => t(`starters:${key}`)) as StarterWords;
};
const problems = starterNames.filter((name) => name !== 'blank');

describe('the starters', () => {
  it.each(languages.flatMap((language) => problems.map((name) => [language, name] as const)))(
    'in %s, %s is a whole brief with a plan in the usual limits',
    (language, name) => {
      const answers = starterAnswers(name, wordsIn(language));
      const read = toBrief(answers);
      if ('problems' in read) throw new RangeError(JSON.stringify(read.problems));
      expect(read.brief.factors.length).toBeGreaterThanOrEqual(3);
      expect(read.brief.factors.length).toBeLessThanOrEqual(5);
      const plans = proposePlans(read.brief);
      expect(plans.length).toBeGreaterThan(0);
      expect(plans.filter(({ recommended }) => recommended)).toHaveLength(1);
    },
  );

  it('are answers that can be saved as they are', () => {
    for (const name of problems) {
      for (const [question, content] of Object.entries(starterAnswers(name, wordsIn('pl')))) {
        const schema = questionSchemas[question as keyof typeof questionSchemas];
        expect(schema.safeParse(content).error).toBeUndefined();
      }
    }
  });

  it('never claim that a caution is in place, nor that nothing can hurt', () => {
    for (const name of problems) {
      const answers = starterAnswers(name, wordsIn('en'));
      expect(answers.hazards?.ticked.length).toBeGreaterThan(0);
      expect('problems' in readFinished(answers, 'hazards')).toBe(true);
    }
  });

  it('write figures with the decimal mark of the language', () => {
    const dwellIn = (language: 'en' | 'pl') =>
      starterAnswers('sealing', wordsIn(language)).settings?.settings[1]?.low;
    expect([dwellIn('en'), dwellIn('pl')]).toEqual(['0.8', '0,8']);
  });

  it('give nothing for a blank start', () => {
    expect(starterAnswers('blank', wordsIn('en'))).toEqual({});
  });
});
