import { describe, expect, it } from 'vitest';
import { demoRunTexts } from '../../../tests/fixtures/run-texts.ts';
import { demoVerdictTexts } from '../../../tests/fixtures/verdict-texts.ts';
import { languages } from '../../i18n/languages.ts';
import { countSegments, isSevenBit } from '../../lib/messages/index.ts';
import { type TemplateName, type TemplateParams, templateNames, templates } from './templates.ts';
import { writeMessage } from './write-message.ts';

const link = 'https://trywell.example/invite/abcdefghijklmnopqrstuv';
const samples: { [Name in TemplateName]: TemplateParams<Name> } = {
  consent: { shop: 'Harrow Lane Foods', asker: 'Dana' },
  practice: {},
  practiceSaved: { value: '41.5' },
  textsCheck: { shop: 'Harrow Lane Foods' },
  invitation: { shop: 'Harrow Lane Foods', inviter: 'Dana', link, days: 7 },
  reset: { link, minutes: 30 },
  emailChanged: { name: 'Dana', shop: 'Harrow Lane Foods' },
  planWaiting: { asker: 'Dana', trial: 'Line 3 seals', link },
  planSentBack: { reviewer: 'Sam', trial: 'Line 3 seals', link },
  planApproved: { reviewer: 'Sam', trial: 'Line 3 seals', link },
  verdictReady: { trial: 'Line 3 seals', link },
  planWaitingText: { shop: 'Harrow Lane Foods', asker: 'Dana', trial: 'Line 3 seals' },
  planSentBackText: { shop: 'Harrow Lane Foods', reviewer: 'Sam', trial: 'Line 3 seals' },
  planApprovedText: { shop: 'Harrow Lane Foods', reviewer: 'Sam', trial: 'Line 3 seals' },
  ...demoRunTexts,
  ...demoVerdictTexts,
};

/** Words and figures among the parameters, however deep; the names of kinds are no words. */
function wordsOf(params: object): string[] {
  return Object.entries(params).flatMap(([field, value]) => {
    if (value !== null && typeof value === 'object') return wordsOf(value);
    // A count of one needs no figure: "text the number".
    const isCode = ['kind', 'what', 'count'].includes(field) || typeof value === 'boolean';
    return isCode ? [] : [String(value)];
  });
}

describe.each(templateNames)('%s', (template) => {
  it.each(languages)('is written in %s, with every parameter in its place', (language) => {
    const params = samples[template];
    const { subject, body } = writeMessage({ template, params, language, plainLetters: false });
    expect(body).not.toMatch(/\{\{|\}\}|texts:|mail:|undefined/);
    expect(body).not.toBe('');
    for (const value of wordsOf(params)) expect(`${subject} ${body}`).toContain(value);
    if (language !== 'en') {
      expect(body).not.toBe(writeMessage({ template, params, language: 'en', plainLetters: false }).body);
    }
  });

  it('refuses parameters that are not its own', () => {
    expect(() =>
      writeMessage({ template, params: { other: 1 }, language: 'en', plainLetters: true }),
    ).toThrow();
  });
});

describe('texts in plain letters', () => {
  const texts = templateNames.filter(
    (name) =>
      templates[name].channel === 'text' && !Object.hasOwn({ ...demoRunTexts, ...demoVerdictTexts }, name),
  );

  it.each(languages)('fit one segment each in %s with the demo shop', (language) => {
    for (const template of texts) {
      const { body, segments } = writeMessage({
        template,
        params: samples[template],
        language,
        plainLetters: true,
      });
      expect(isSevenBit(body), template).toBe(true);
      expect([template, segments, countSegments(body).unitsLeft >= 0]).toEqual([template, 1, true]);
    }
  });

  it('keep Vietnamese marks for who wants them', () => {
    const marked = writeMessage({
      template: 'practice',
      params: {},
      language: 'vi',
      plainLetters: false,
    });
    expect(marked.body).toContain('chạy thử');
    expect(marked.segments).toBe(3);
  });

  it('teach no word of the carrier but STOP, and that one only where consent is asked', () => {
    for (const language of languages) {
      for (const template of texts) {
        const { body } = writeMessage({ template, params: samples[template], language, plainLetters: true });
        expect(/\bSTOP\b/.test(body)).toBe(template === 'consent');
        expect(body).not.toMatch(
          /\b(STOPALL|UNSUBSCRIBE|CANCEL|END|QUIT|REVOKE|OPTOUT|START|UNSTOP|YES|HELP|INFO)\b/,
        );
      }
    }
  });
});

describe('plurals of a link that lasts', () => {
  it.each([
    ['en', 1, '1 day '],
    ['en', 7, '7 days '],
    ['pl', 1, '1 dzień '],
    ['pl', 3, '3 dni '],
    ['es', 1, '1 día '],
    ['vi', 2, '2 ngày '],
  ] as const)('%s %i', (language, days, words) => {
    const params = { ...samples.invitation, days };
    expect(writeMessage({ template: 'invitation', params, language, plainLetters: false }).body).toContain(
      words,
    );
  });
});
