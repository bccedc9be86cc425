import { describe, expect, it } from 'vitest';
import { finishedAnswers } from '../../../tests/builders/answers.ts';
import { proposePlans } from '../../lib/doe/index.ts';
import type { Answers } from './answers.schema.ts';
import { missingAnswers, missingVersions } from './missing-answers.ts';
import { toBrief } from './to-brief.ts';

function briefOf(answers: Answers) {
  const read = toBrief(answers);
  if ('problems' in read) throw new Error(JSON.stringify(read.problems));
  return read;
}

function problemsOf(answers: Answers) {
  const read = toBrief(answers);
  if ('brief' in read) throw new Error('toBrief found nothing');
  return read.problems.map(({ question, pointer, code }) => `${question}${pointer} ${code}`);
}

const rejects: Answers = {
  result: { name: 'open seals', kind: 'rejects', wish: 'less', lotSize: '50' },
  usual: { usual: '4', lowest: '2', highest: '7' },
  worth: { change: '2' },
  limit: { atMost: '3' },
};

describe('toBrief', () => {
  it('reads finished answers as the core wants them', () => {
    const { brief, settingOfLetter } = briefOf(finishedAnswers());
    expect(brief).toEqual({
      response: {
        name: 'seal strength',
        unit: 'N',
        kind: 'measured',
        goal: 'more',
        partsPerRun: 3,
        lower: 38,
        limitFor: 'mean',
        usualRate: 35,
        worthHaving: 3.5,
      },
      watch: [],
      factors: [
        {
          name: 'Jaw temp',
          panelName: 'JAW TEMP',
          kind: 'number',
          unit: 'C',
          low: 140,
          high: 160,
          usual: 150,
          harderEnd: 'high',
        },
        { name: 'Dwell', kind: 'number', unit: 's', low: 0.6, high: 1, usual: 0.8 },
        { name: 'Film', kind: 'choice', low: 'Supplier A', high: 'Supplier B', usual: 'low' },
      ],
      forbidden: [{ A: 1, B: 1 }],
      budget: { maxRuns: 20, minutesPerRun: 10 },
      noise: { sd: 2, of: 'part', df: 4 },
    });
    expect(settingOfLetter).toEqual(['temp', 'dwell', 'film']);
    expect(proposePlans(brief).length).toBeGreaterThan(0);
  });

  it('takes a score for a measured number with steps of one', () => {
    const { brief } = briefOf(
      finishedAnswers({
        result: { name: 'gloss', kind: 'scored', wish: 'more' },
        usual: { usual: '6', lowest: '5', highest: '8' },
        worth: { change: '1' },
        limit: { noLimit: true },
      }),
    );
    expect(brief.response).toMatchObject({ kind: 'measured', resolution: 1, usualRate: 6 });
    expect(brief.response).not.toHaveProperty('lower');
  });

  it('turns bad ones out of the lot into shares', () => {
    const { brief } = briefOf(finishedAnswers(rejects));
    expect(brief.response).toMatchObject({
      kind: 'rejects',
      lotSize: 50,
      usualRate: 0.08,
      worthHaving: 0.04,
      upper: 0.06,
    });
    expect(brief.response).not.toHaveProperty('partsPerRun');
    expect(brief.noise).toEqual({ sd: 0.025, of: 'runMean', df: 4 });
  });

  it('lets past numbers outweigh the lowest and the highest, and "not sure" outweigh both', () => {
    const past = { usual: '', past: '34,5\n36\n37,5\n', lowest: '1', highest: '99' };
    const { brief } = briefOf(finishedAnswers({ usual: past }));
    expect(brief.noise).toEqual({ sd: 1.5, of: 'part', df: 2 });
    expect(brief.response.usualRate).toBe(36);
    expect(briefOf(finishedAnswers({ usual: { ...past, notSure: true } })).brief.noise).toBeNull();
    expect(briefOf(finishedAnswers({ usual: { notSure: true } })).brief.response).not.toHaveProperty(
      'usualRate',
    );
  });

  it('forbids what was ruled out on the last page, and forgets mixes of settings that are gone', () => {
    const look = {
      mixes: [
        { ends: { temp: 'high', dwell: 'low', film: 'low' }, decision: 'ruledOut' },
        { ends: { temp: 'low', dwell: 'low', film: 'low' }, decision: 'runBefore' },
        { ends: { gone: 'low', dwell: 'low' }, decision: 'ruledOut' },
        { ends: { temp: 'low', dwell: 'high' } },
      ],
    } as const;
    const { brief } = briefOf(finishedAnswers({ look: { mixes: look.mixes.map((mix) => ({ ...mix })) } }));
    expect(brief.forbidden).toEqual([
      { A: 1, B: 1 },
      { A: 1, B: -1, C: -1 },
    ]);
  });

  it('splits the runs by one thing', () => {
    const { around } = finishedAnswers();
    const split = { ...around, batch: { way: 'split', count: '4', runsEach: '6' } } as const;
    expect(briefOf(finishedAnswers({ around: split })).brief.blocks).toEqual({
      name: 'batch',
      kind: 'batch',
      count: 4,
      runsEach: 6,
    });
    const twice = { ...split, shift: { way: 'split' } } as const;
    expect(problemsOf(finishedAnswers({ around: twice }))).toEqual(['around#/shift/way one-split']);
  });

  it('waits for a number that comes later, and holds to hours and money only where they are not open', () => {
    const measuring = { when: 'minutes', minutes: '20 min' } as const;
    const spare = { hours: '4', money: '200', costPerRun: '12,50' };
    expect(briefOf(finishedAnswers({ measuring, spare })).brief.budget).toEqual({
      maxRuns: 16,
      minutes: 240,
      minutesPerRun: 30,
      money: 200,
      costPerRun: 12.5,
    });
    const open = { ...spare, hoursOpen: true, moneyOpen: true, minutesPerRun: '15' };
    expect(briefOf(finishedAnswers({ spare: open })).brief.budget).toEqual({
      maxRuns: 16,
      minutesPerRun: 15,
      costPerRun: 12.5,
    });
    expect(problemsOf(finishedAnswers({ spare: { money: '200' } }))).toEqual(['spare#/costPerRun missing']);
  });

  it('names what is wrong, field by field', () => {
    const settings = {
      settings: [
        { id: 'a', kind: 'number', name: 'Jaw', low: '160', high: '140', usual: '150' },
        { id: 'b', kind: 'number', name: ' jaw ', low: '1', high: '2', usual: '3', max: '1.5' },
        { id: 'c', kind: 'choice', name: '', low: 'A', high: 'a' },
      ],
    } as const;
    const answers = finishedAnswers({
      settings: { settings: settings.settings.map((setting) => ({ ...setting })) },
    });
    expect(problemsOf(answers)).toEqual([
      'settings#/settings/0/low low-not-below-high',
      'settings#/settings/1/high beyond-machine',
      'settings#/settings/1/usual usual-outside',
      'settings#/settings/2/name missing',
      'settings#/settings/2/usual not-a-choice',
    ]);
  });

  it('names what does not agree', () => {
    const gone = {
      mixes: [
        {
          id: 'm',
          parts: [
            { setting: 'temp', end: 'low' },
            { setting: 'x', end: 'low' },
          ],
        },
      ],
    } as const;
    const watch = {
      results: [{ id: 'w', name: 'Open  seals', kind: 'flaws', wish: 'less', usual: '-1' }],
    } as const;
    const answers = finishedAnswers({
      ...rejects,
      usual: { usual: '60', lowest: '2', highest: '7' },
      worth: { change: '51' },
      neverRun: { mixes: gone.mixes.map((mix) => ({ ...mix, parts: [...mix.parts] })) },
      watch: { results: watch.results.map((result) => ({ ...result })) },
    });
    expect(problemsOf(answers)).toEqual([
      'usual#/usual off-scale',
      'worth#/change too-big',
      'watch#/results/0/name same-name',
      'watch#/results/0/usual off-scale',
      'neverRun#/mixes/0/parts/1 setting-gone',
    ]);
  });
});

describe('missingAnswers', () => {
  it('finds nothing where all is said', () => {
    expect(missingAnswers(finishedAnswers())).toEqual([]);
  });

  it('asks for at most six answers a page, and each one once', () => {
    const missing = missingAnswers({}).map(({ question, pointer }) => question + pointer);
    expect(missing).toEqual([
      'job#/machine',
      'result#/name',
      'result#/wish',
      'result#/kind',
      'usual#/usual',
      'usual#/lowest',
      'usual#/highest',
      'worth#/change',
      'limit#/atLeast',
      'settings#/settings',
      'hazards#/none',
      'stop#/picked',
      'call#/lines',
      'parts#/fate',
      'around#/batch/way',
      'around#/shift/way',
      'around#/machine/way',
      'around#/gauge/way',
      'around#/room/way',
      'around#/crew/way',
      'crew#/shifts',
      'ready#/ticked',
    ]);
  });

  it('asks for own stop rules in each language of the crew', () => {
    const answers = finishedAnswers({ stop: { picked: [], own: { en: 'Film tears', pl: ' ' } } });
    expect(missingVersions(answers, ['en', 'pl', 'vi', 'vi']).map(({ pointer }) => pointer)).toEqual([
      '#/own/pl',
      '#/own/vi',
    ]);
    expect(missingVersions(finishedAnswers(), ['vi'])).toEqual([]);
  });
});
