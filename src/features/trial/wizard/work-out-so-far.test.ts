import { describe, expect, it } from 'vitest';
import type { Answers, SettingAnswer } from '../answers.schema.ts';
import { countStepGaps, listToDo, seenSteps, stepStatesOf } from './step-states.ts';
import { workOutSoFar } from './work-out-so-far.ts';

function number(id: string, low: string, high: string, usual: string): SettingAnswer {
  return { id, kind: 'number', name: id, unit: 'C', low, high, usual };
}

const answers: Answers = {
  job: { machine: 'Line 3' },
  result: { name: 'seal strength', unit: 'N', wish: 'more', kind: 'measured' },
  usual: { usual: '35', lowest: '31', highest: '39' },
  worth: { change: '3' },
  settings: {
    settings: [
      number('jaw', '140', '160', '150'),
      number('dwell', '0,8', '1,0', '0,8'),
      { id: 'film', kind: 'choice', name: 'Film', low: 'A', high: 'B', usual: 'low' },
    ],
  },
};

describe('what the answers mean so far', () => {
  it('is a plan with its runs as soon as result, worth and settings are there', () => {
    const { proposals, runs, brief, missing, misfit } = workOutSoFar(answers);
    expect(missing).toBe(0);
    expect(misfit).toBeNull();
    expect(runs).toHaveLength(proposals[0]?.runs ?? Number.NaN);
    expect(brief?.factors.map(({ name }) => name)).toEqual(['jaw', 'dwell', 'Film']);
    expect(runs).toEqual(workOutSoFar(structuredClone(answers)).runs);
  });

  it('is how many answers are missing before that, never an error', () => {
    expect(workOutSoFar({}).missing).toBeGreaterThan(0);
    expect(workOutSoFar({ ...answers, worth: { change: 'three' } }).missing).toBe(1);
    expect(workOutSoFar({ ...answers, usual: { lowest: 'x' } }).missing).toBe(0);
  });

  it('says why nothing fits', () => {
    const names = ['one', 'two', 'three', 'four', 'five', 'six', 'seven'];
    const settings = names.map((name) => number(name, '1', '3', '2'));
    const { misfit, proposals } = workOutSoFar({ ...answers, settings: { settings }, spare: { runs: '4' } });
    expect(proposals).toEqual([]);
    expect(misfit?.code).toBe('too-few-runs');
  });

  it('remarks on a range while it is typed, and knows today’s ups and downs', () => {
    const { coaching, today } = workOutSoFar({
      settings: { settings: [{ ...number('jaw', '145', '147', '146'), step: '1' } as SettingAnswer] },
      usual: { lowest: '31', highest: '39' },
      gauge: { pairs: [{ first: '35', second: '35,2' }, {}, { first: '36' }] },
    });
    expect(coaching.map(({ kind }) => kind)).toContain('range-close-to-step');
    expect(today).toMatchObject({ swing: 4, suggestions: [2, 3, 5], mean: null, gauge: { pairs: 1 } });
  });
});

describe('the pages above the question', () => {
  it('are done or have a gap once they were seen, and lead to the first gap', () => {
    const seen = seenSteps(['problem', 'settings']);
    expect(seen).toEqual(['problem', 'today', 'settings']);
    expect(stepStatesOf(answers, seen)).toMatchObject({
      problem: 'done',
      today: 'gap',
      settings: 'done',
      safety: 'open',
    });
    expect(countStepGaps(answers, 'today')).toBe(1);
    expect(listToDo(answers, seen)).toEqual({ count: 1, first: 'today' });
  });
});
