import { describe, expect, it } from 'vitest';
import { finishedAnswers } from '../../../tests/builders/answers.ts';
import { readFinished } from './answer-problem.ts';
import type { AnswerOf, Answers, QuestionName } from './answers.schema.ts';
import { finishedSchemas, questionsInOrder, untouched } from './finished.schema.ts';

function faultsOf<Name extends QuestionName>(question: Name, content: AnswerOf<Name>): string[] {
  const read = readFinished({ [question]: content } as Answers, question);
  return 'problems' in read ? read.problems.map(({ pointer, code }) => `${pointer} ${code}`) : [];
}

describe('finished answers', () => {
  it('are known for every question, and untouched ones are refused or have a default', () => {
    expect(Object.keys(finishedSchemas)).toEqual(Object.keys(untouched));
    for (const question of questionsInOrder) {
      const parsed = finishedSchemas[question].safeParse(untouched[question]);
      expect(() => JSON.stringify(parsed.data)).not.toThrow();
      const read = readFinished(finishedAnswers(), question);
      expect('problems' in read ? [question, read.problems] : []).toEqual([]);
    }
  });

  it.each<[string, QuestionName, unknown, string[]]>([
    [
      'a scored target off its scale',
      'result',
      { name: 'gloss', kind: 'scored', wish: 'target', target: '11' },
      ['#/target off-scale'],
    ],
    [
      'a measured result without unit',
      'result',
      { name: 'x', kind: 'measured', wish: 'more' },
      ['#/unit missing'],
    ],
    ['bad ones without a lot', 'result', { name: 'x', kind: 'rejects', wish: 'less' }, ['#/lotSize missing']],
    ['half a part', 'measuring', { partsPerRun: '2.5' }, ['#/partsPerRun not-whole']],
    ['a wait nobody gave', 'measuring', { when: 'minutes' }, ['#/minutes missing']],
    [
      'a lowest above the highest',
      'usual',
      { usual: '5', lowest: '9', highest: '4' },
      ['#/lowest low-not-below-high'],
    ],
    ['two past numbers', 'usual', { past: '3 4' }, ['#/past too-few-numbers']],
    ['past words', 'usual', { past: '3 4 five' }, ['#/past not-a-number']],
    ['a gain of nothing', 'worth', { change: '0' }, ['#/change not-above-zero']],
    ['no word on a limit', 'limit', {}, ['#/atLeast limit-or-none']],
    ['limits crossed', 'limit', { atLeast: '5', atMost: '4' }, ['#/atLeast low-not-below-high']],
    ['half a gauge pair', 'gauge', { pairs: [{ first: '1' }] }, ['#/pairs/0/second missing']],
    [
      'hazards and none of these',
      'hazards',
      { none: true, ticked: [{ hazard: 'pressure', cautions: [], protects: 'shield' }] },
      ['#/none some-or-none'],
    ],
    [
      'a hazard against which nothing stands',
      'hazards',
      { ticked: [{ hazard: 'pressure', cautions: [], protects: ' ' }] },
      ['#/ticked/0/protects missing'],
    ],
    ['no stop rule', 'stop', { picked: [], own: { en: ' ' } }, ['#/picked missing']],
    [
      'a mix of one',
      'neverRun',
      { mixes: [{ id: 'm', parts: [{ setting: 'a', end: 'low' }] }] },
      ['#/mixes/0/parts mix-of-two'],
    ],
    [
      'a split in three',
      'around',
      { ...finishedAnswers().around, batch: { way: 'split', count: '3' } },
      ['#/batch/count two-or-four'],
    ],
    [
      'crews split',
      'around',
      { ...finishedAnswers().around, crew: { way: 'split' } },
      ['#/crew/way not-a-choice'],
    ],
    [
      'a time that is none',
      'crew',
      { shifts: [{ id: 's', runs: 'x', from: '25:00' }] },
      ['#/shifts/0/from not-a-time'],
    ],
    ['a day that is none', 'pace', { startDate: '2026-13-40' }, ['#/startDate not-a-date']],
    ['a beat without minutes', 'pace', { next: 'every' }, ['#/everyMinutes missing']],
    ['three reminders', 'pace', { remindTimes: '3' }, ['#/remindTimes too-big']],
    ['a list half ticked', 'ready', { ticked: ['guardsOn'] }, ['#/ticked tick-all']],
    ['a name with a line break', 'job', { machine: 'Line\n3' }, ['#/machine does-not-fit']],
  ])('refuse %s', (_, question, content, faults) => {
    expect(faultsOf(question, content as never)).toEqual(faults);
  });
});
