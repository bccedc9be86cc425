import { type AnswerProblem, readFinished } from '../answer-problem.ts';
import type { Answers, QuestionName } from '../answers.schema.ts';
import { fitsScale } from '../finished/problem.schema.ts';
import { foldName } from '../finished/typed-fields.ts';
import type { FinishedOf } from '../finished.schema.ts';
import { limitsOffScale, widestChange } from './result-scale.ts';

/** The questions that a plan hangs on. */
export const briefQuestions = [
  'result',
  'measuring',
  'usual',
  'worth',
  'limit',
  'watch',
  'settings',
  'neverRun',
  'around',
  'spare',
  'look',
] as const satisfies readonly QuestionName[];
type BriefQuestion = (typeof briefQuestions)[number];
export type BriefAnswers = { [Name in BriefQuestion]: FinishedOf<Name> };

function readEach(answers: Answers): { finished: BriefAnswers } | { problems: AnswerProblem[] } {
  const finished: Partial<Record<BriefQuestion, unknown>> = {};
  const problems: AnswerProblem[] = [];
  for (const question of briefQuestions) {
    // What was decided about the hardest mixes follows the plan; an undecided one rules nothing out.
    const read = readFinished(question === 'look' ? decidedOnly(answers) : answers, question);
    if ('problems' in read) problems.push(...read.problems);
    else finished[question] = read.value;
  }
  return problems.length > 0 ? { problems } : { finished: finished as BriefAnswers };
}

function decidedOnly(answers: Answers): Answers {
  const mixes = answers.look?.mixes.filter(({ decision }) => decision !== undefined) ?? [];
  return { ...answers, look: { mixes } };
}

/** What is wrong with answers that are each right by themselves. */
function problemsBetween(finished: BriefAnswers): AnswerProblem[] {
  const { result, usual, worth, limit, watch, settings, neverRun } = finished;
  const problems: AnswerProblem[] = [];
  const add = (question: QuestionName, pointer: string, code: string, values?: AnswerProblem['values']) =>
    problems.push({ question, pointer, code, ...(values ? { values } : {}) });
  for (const field of ['usual', 'lowest', 'highest'] as const) {
    const figure = usual[field];
    if (figure !== null && !fitsScale(figure, result)) add('usual', `#/${field}`, 'off-scale');
  }
  if (usual.past.some((figure) => !fitsScale(figure, result))) add('usual', '#/past', 'off-scale');
  const widest = widestChange(result);
  if (widest !== null && worth.change > widest) add('worth', '#/change', 'too-big', { limit: widest });
  for (const side of limitsOffScale(result, limit)) add('limit', `#/${side}`, 'off-scale');
  watch.results.forEach((watched, place) => {
    const names = [result, ...watch.results.slice(0, place)].map(({ name }) => foldName(name));
    if (names.includes(foldName(watched.name))) add('watch', `#/results/${place}/name`, 'same-name');
    if (watched.usual !== null && !fitsScale(watched.usual, watched)) {
      add('watch', `#/results/${place}/usual`, 'off-scale');
    }
    for (const side of limitsOffScale(watched, watched))
      add('watch', `#/results/${place}/${side}`, 'off-scale');
  });
  const known = settings.settings.map(({ id }) => id);
  neverRun.mixes.forEach(({ parts }, place) => {
    parts.forEach(({ setting }, part) => {
      if (!known.includes(setting)) add('neverRun', `#/mixes/${place}/parts/${part}`, 'setting-gone');
    });
  });
  return problems;
}

/** The values of all questions that a plan hangs on, or what is wrong with them: each by itself first, then between them. */
export function readBriefAnswers(
  answers: Answers,
): { finished: BriefAnswers } | { problems: AnswerProblem[] } {
  const read = readEach(answers);
  if ('problems' in read) return read;
  const problems = problemsBetween(read.finished);
  return problems.length > 0 ? { problems } : read;
}
