import { describe, expect, it } from 'vitest';
import {
  eventsOpenTo,
  mayPutAway,
  takesAnswers,
  transitions,
  transitionsOf,
  trialStates,
} from './trial-states.ts';

describe('the states of a trial', () => {
  it('are all reached from a draft, and none but a deleted draft is a dead end', () => {
    const reached = new Set<string>(['draft']);
    for (let size = 0; size < reached.size; ) {
      size = reached.size;
      for (const { from, to } of transitions) if (reached.has(from)) reached.add(to);
    }
    expect(trialStates.filter((state) => !reached.has(state))).toEqual([]);
    expect(trialStates.filter((state) => !transitions.some(({ from }) => from === state))).toEqual([]);
  });

  it('mean one step by an event, or two that a condition tells apart', () => {
    for (const { from, event } of transitions) {
      const steps = transitionsOf(from, event);
      expect(new Set(steps.map(({ when }) => String(when))).size).toBe(steps.length);
    }
  });

  it('are never left for a start without answers and plan, nor approved by who asked', () => {
    for (const { event, when = [] } of transitions) {
      if (event === 'start') expect(when).toContain('complete, plan chosen');
      if (event === 'approve') expect(when).toContain('not the one who asked');
    }
  });

  it('offer what a role may do', () => {
    expect(eventsOpenTo('draft', (permission) => permission === 'trial.write')).toEqual([
      'send for review',
      'change an answer',
      'delete',
    ]);
    expect(eventsOpenTo('plan review', (permission) => permission === 'review.decide')).toEqual([
      'approve',
      'send back',
    ]);
    expect(eventsOpenTo('running', (permission) => permission === 'review.decide')).toEqual([]);
  });

  it('take answers in draft and ready alone, and are put away unless being run', () => {
    expect(trialStates.filter(takesAnswers)).toEqual(['draft', 'ready']);
    expect(trialStates.filter((state) => !mayPutAway(state))).toEqual(['running', 'paused']);
  });
});
