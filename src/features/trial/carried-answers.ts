import type { Answers } from './answers.schema.ts';

/** What a later trial takes over: not what was decided about another plan's runs, nor what was ticked or set for another day. */
export function carriedAnswers(answers: Answers): Answers {
  const { look: _look, ready: _ready, pace, ...kept } = answers;
  const { startDate: _date, startTime: _time, ...manner } = pace ?? {};
  return pace ? { ...kept, pace: manner } : kept;
}
