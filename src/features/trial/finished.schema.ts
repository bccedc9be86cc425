import type { z } from 'zod';
import { type AnswerOf, type Answers, type QuestionName, questionNames } from './answers.schema.ts';
import { aroundFinished } from './finished/around.schema.ts';
import { jobFinished, measuringFinished, resultFinished } from './finished/problem.schema.ts';
import {
  callFinished,
  hazardsFinished,
  neverRunFinished,
  partsFinished,
  stopFinished,
} from './finished/safety.schema.ts';
import { settingsFinished } from './finished/settings.schema.ts';
import {
  crewFinished,
  lookFinished,
  paceFinished,
  readyFinished,
  spareFinished,
} from './finished/start.schema.ts';
import {
  gaugeFinished,
  limitFinished,
  usualFinished,
  valueFinished,
  watchFinished,
  worthFinished,
} from './finished/today.schema.ts';

/**
 * What a finished answer is: reads what was typed into values (figures, defaults) or names the fields that do not fit.
 * Forms resolve with these, and a trial starts only when each of them is content.
 */
export const finishedSchemas = {
  job: jobFinished,
  result: resultFinished,
  measuring: measuringFinished,
  usual: usualFinished,
  worth: worthFinished,
  limit: limitFinished,
  watch: watchFinished,
  value: valueFinished,
  gauge: gaugeFinished,
  settings: settingsFinished,
  hazards: hazardsFinished,
  stop: stopFinished,
  call: callFinished,
  neverRun: neverRunFinished,
  parts: partsFinished,
  around: aroundFinished,
  spare: spareFinished,
  crew: crewFinished,
  pace: paceFinished,
  look: lookFinished,
  ready: readyFinished,
} as const satisfies Record<QuestionName, z.ZodType>;

export type FinishedOf<Name extends QuestionName> = z.output<(typeof finishedSchemas)[Name]>;

/** A question before anything was typed. */
export const untouched: { [Name in QuestionName]: AnswerOf<Name> } = {
  job: {},
  result: {},
  measuring: {},
  usual: {},
  worth: {},
  limit: {},
  watch: { results: [] },
  value: {},
  gauge: { pairs: [] },
  settings: { settings: [] },
  hazards: { ticked: [] },
  stop: { picked: [] },
  call: { lines: [] },
  neverRun: { mixes: [] },
  parts: {},
  around: {},
  spare: {},
  crew: { shifts: [] },
  pace: {},
  look: { mixes: [] },
  ready: { ticked: [] },
};

/** What was typed for a question, or the question before anything was. */
export function contentOf<Name extends QuestionName>(answers: Answers, question: Name): AnswerOf<Name> {
  return (answers[question] as AnswerOf<Name> | undefined) ?? untouched[question];
}

/** The questions in the order in which the pages ask them. */
export const questionsInOrder: readonly QuestionName[] = questionNames;
