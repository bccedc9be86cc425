import { describe, expect, it } from 'vitest';
import { demoPrompt, demoRunTexts, longPrompt } from '../../../tests/fixtures/run-texts.ts';
import { languages } from '../../i18n/languages.ts';
import { countSegments, isSevenBit, readReply } from '../../lib/messages/index.ts';
import { measurePrompt } from './prompt-length.ts';
import type { RunPrompt } from './run-prompt.ts';
import { runTemplates } from './run-templates.ts';
import { writeMessage } from './write-message.ts';

type RunTemplateName = keyof typeof runTemplates;
const names = Object.keys(runTemplates) as RunTemplateName[];
/** Texts whose words list usual settings or all answers: two segments; the others are one. */
const longer: readonly RunTemplateName[] = [
  'runPrompt',
  'practiceRun',
  'helpRun',
  'helpIdle',
  'stopped',
  'backToUsual',
  'endedEarly',
];

function write(template: RunTemplateName, params: unknown, language: (typeof languages)[number]) {
  return writeMessage({ template, params, language, plainLetters: true });
}

describe.each(languages)('texts of a running trial in %s', (language) => {
  it.each(names)('%s is in plain letters, its segments as promised', (name) => {
    const { body, segments } = write(name, demoRunTexts[name], language);
    expect(body).not.toMatch(/\{\{|\}\}|run-texts:|undefined/);
    expect(isSevenBit(body), body).toBe(true);
    const most = longer.includes(name) ? 2 : 1;
    expect([name, segments, countSegments(body).units <= (most === 1 ? 160 : 306)], body).toEqual([
      name,
      segments === 1 ? 1 : most,
      true,
    ]);
  });

  it('fits a prompt with four names of twelve letters in two segments, whatever it asks for', () => {
    for (const change of [{}, { later: true }, { ask: { ...demoPrompt.ask, count: 1, example: '41.5' } }]) {
      const { body } = write('runPrompt', { ...longPrompt, ...change }, language);
      expect(countSegments(body).units, body).toBeLessThanOrEqual(306);
    }
  });

  it('fits a prompt with Vietnamese marks in three segments', () => {
    if (language !== 'vi') return;
    const settings = demoPrompt.settings.map(({ value }) => ({ name: 'TWELVE LETRS', value }));
    const params = { ...demoPrompt, settings };
    const marked = writeMessage({ template: 'runPrompt', params, language, plainLetters: false });
    expect(marked.segments, marked.body).toBeLessThanOrEqual(3);
  });

  it('puts each value last on its line, whole', () => {
    const lines = write('runPrompt', longPrompt, language).body.split('\n');
    for (const { name, value } of longPrompt.settings) expect(lines).toContain(`${name} ${value}`);
  });

  it('shows an example that would be read as it is meant', () => {
    const { ask } = demoPrompt;
    const items = [{ key: 'a', kind: ask.kind, readings: ask.count }];
    const reply = readReply(ask.example, {
      items,
      openRuns: [{ run: 4, state: 'make' }],
      settings: [],
      language,
    });
    expect(reply).toMatchObject({ intent: 'reading', values: { a: [41.5, 40.8, 42] } });
  });

  it('teaches only words that are read, in capitals', () => {
    const taught = {
      skip: write('remind', demoRunTexts.remind, language).body,
      danger: write('runPrompt', demoPrompt, language).body,
    };
    const capitals = (body: string) => body.match(/\p{Lu}{2,}(?: \p{Lu}{2,})*/gu) ?? [];
    const intents = (body: string) =>
      capitals(body).map((word) => readReply(word, { items: [], openRuns: [], settings: [] }).intent);
    expect(intents(taught.skip)).toEqual(expect.arrayContaining(['skip', 'later']));
    expect(intents(taught.danger)).toContain('danger');
    for (const name of names) {
      const { body } = write(name, demoRunTexts[name], language);
      expect(body).not.toMatch(
        /\b(STOPALL|UNSUBSCRIBE|CANCEL|END|QUIT|REVOKE|OPTOUT|START|UNSTOP|YES|HELP|INFO)\b/,
      );
    }
  });
});

describe('a prompt that is too long', () => {
  const reader = { language: 'en', plainLetters: true } as const;
  const wordy: RunPrompt = {
    ...longPrompt,
    settings: longPrompt.settings.map((setting, place) =>
      place === 2
        ? { ...setting, name: 'PRESSURE OF THE LOWER SEALING JAW ON THE LEFT SIDE OF THE MACHINE BED PLATE' }
        : setting,
    ),
    machine: 'The second packing line of hall number three',
    label: 'HOLD FOR DANA',
  };

  it('says which name to shorten, and by how much', () => {
    const found = measurePrompt(wordy, reader);
    if (found.fits) throw new Error('expected a prompt that does not fit');
    expect(found.name).toContain('LOWER SEALING JAW');
    const settings = wordy.settings.map((setting) =>
      setting.name === found.name ? { ...setting, name: setting.name.slice(0, -found.letters) } : setting,
    );
    expect(measurePrompt({ ...wordy, settings }, reader)).toEqual({ fits: true });
  });

  it('is told from one that fits', () => {
    expect(measurePrompt(longPrompt, reader)).toEqual({ fits: true });
  });
});
