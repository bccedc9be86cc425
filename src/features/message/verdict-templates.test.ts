import { describe, expect, it } from 'vitest';
import { demoVerdictTexts } from '../../../tests/fixtures/verdict-texts.ts';
import { languages } from '../../i18n/languages.ts';
import { countSegments, isSevenBit } from '../../lib/messages/index.ts';
import { verdictTemplates } from './verdict-templates.ts';
import { writeMessage } from './write-message.ts';

type Name = keyof typeof verdictTemplates;
const names = Object.keys(verdictTemplates) as Name[];
const texts = names.filter((name) => verdictTemplates[name].channel === 'text');
const subjects = ['verdict', 'adoption'] as const;

describe.each(languages)('messages after a trial in %s', (language) => {
  const write = (template: Name, params: unknown) =>
    writeMessage({ template, params, language, plainLetters: true });

  it.each(texts)('%s is in plain letters, one segment, or two where it lists settings', (name) => {
    for (const what of subjects) {
      const params =
        'what' in demoVerdictTexts[name] ? { ...demoVerdictTexts[name], what } : demoVerdictTexts[name];
      const { body } = write(name, params);
      expect(isSevenBit(body), body).toBe(true);
      expect(countSegments(body).units, body).toBeLessThanOrEqual(name === 'settingsInUseText' ? 306 : 160);
    }
  });

  it('fits two segments with four settings whose names fill the panel', () => {
    const settings = 'UPPER JAW T1 162.5, DWELL TIME 2 0.95, JAW PRESSURE 3.75, FILM ROLL NO Supplier A';
    const { body } = write('settingsInUseText', {
      machine: 'Packing line 3',
      settings,
      caller: 'Dana, ext 12',
    });
    expect(countSegments(body).units, body).toBeLessThanOrEqual(306);
    expect(body).toContain(settings);
  });

  it.each(names)('%s says each subject in words of its own', (name) => {
    const params = demoVerdictTexts[name];
    if (!('what' in params)) return;
    const [one, other] = subjects.map((what) => write(name, { ...params, what }).body);
    expect(one).not.toBe(other);
    for (const body of [one, other]) expect(body).not.toMatch(/\{\{|undefined|signOff/);
  });
});
