import { describe, expect, it } from 'vitest';
import { runStates } from './run.ts';
import { runEventsOpenTo, runStepOf, runSteps, statesBefore } from './run-states.ts';

describe('the states of a run', () => {
  it('are all reached from waiting, and each can be left or mended', () => {
    const reached = new Set<string>(['waiting']);
    for (let size = 0; size < reached.size; ) {
      size = reached.size;
      for (const { from, to } of runSteps) if (reached.has(from)) reached.add(to);
    }
    expect(runStates.filter((state) => !reached.has(state))).toEqual([]);
    expect(statesBefore('correct')).toEqual(['done']);
    expect(statesBefore('put back')).toEqual(['skipped']);
  });

  it('mean one step by an event', () => {
    const named = runSteps.map(({ from, event }) => `${from}: ${event}`);
    expect(new Set(named).size).toBe(named.length);
  });

  it('take a reading from the board while waiting, and never two for a run that is done', () => {
    expect(runStepOf('waiting', 'record')?.to).toBe('done');
    expect(runStepOf('done', 'record')).toBeUndefined();
    expect(runStepOf('skipped', 'record')).toBeUndefined();
  });

  it('offer what a role may do', () => {
    const own = runEventsOpenTo('asked', (permission) => permission === 'run.record.own');
    expect(own).toEqual(['make', 'record part', 'record', 'skip', 'note']);
    const whole = runEventsOpenTo('done', (permission) => permission === 'run.record');
    expect(whole).toEqual(['repeat', 'note', 'set actual']);
    expect(runEventsOpenTo('done', () => false)).toEqual([]);
  });
});
