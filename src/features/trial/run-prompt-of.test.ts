import { describe, expect, it } from 'vitest';
import { finishedAnswers } from '../../../tests/builders/answers.ts';
import { writeMessage } from '../message/write-message.ts';
import { runPromptOf } from './run-prompt-of.ts';

const prompted = {
  run: { order: 4, planned: [160, 0.6, 'Supplier B'] },
  runs: 11,
  settingIds: ['temp', 'dwell', 'film'],
};

describe('the text of a run', () => {
  it('says what the answers and the plan say', () => {
    const params = runPromptOf(finishedAnswers(), prompted, 'en');
    const { body, segments } = writeMessage({
      template: 'runPrompt',
      params,
      language: 'en',
      plainLetters: true,
    });
    expect(body.split('\n').slice(0, 4)).toEqual([
      'Line 3, run 4 of 11',
      'JAW TEMP 160',
      'Dwell 0.6',
      'Film Supplier B',
    ]);
    expect(body).toContain('Make 3, mark HOLD.');
    expect(body).toContain('seal strength: text 3 numbers, like 35 34 36');
    expect(body).toContain('DANGER');
    expect(segments).toBeLessThanOrEqual(2);
  });

  it('writes values with the reader’s decimal mark and no mark between thousands', () => {
    const run = { order: 1, planned: [1200, 0.6, 'A'] };
    const values = runPromptOf(finishedAnswers(), { ...prompted, run }, 'pl')?.settings;
    expect(values?.map(({ value }) => value)).toEqual(['1200', '0,6', 'A']);
  });

  it('makes as many parts as the result with the largest lot needs, and asks for DONE where the number comes later', () => {
    const answers = finishedAnswers({
      measuring: { who: 'other', when: 'later', partsPerRun: '3' },
      watch: {
        results: [{ id: 'w', name: 'burnt', wish: 'less', kind: 'rejects', lotSize: '50', noLimit: true }],
      },
      hazards: { none: true, ticked: [] },
    });
    expect(runPromptOf(answers, prompted, 'en')).toMatchObject({ make: 50, later: true, hazard: false });
  });

  it('is not written while an answer that stands in it is missing', () => {
    expect(runPromptOf(finishedAnswers({ result: {} }), prompted, 'en')).toBeNull();
  });
});
