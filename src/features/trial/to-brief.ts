import type { Brief, ForbiddenRule } from '../../lib/doe/index.ts';
import { type AnswerProblem, readFinished } from './answer-problem.ts';
import type { Answers, QuestionName } from './answers.schema.ts';
import { toBlocks, toBudget, toNoise, usualFigure } from './brief/brief-limits.ts';
import { limitsOffScale, toResponse, widestChange } from './brief/brief-result.ts';
import { toFactor, toRule } from './brief/brief-settings.ts';
import { fitsScale } from './finished/problem.schema.ts';
import { foldName } from './finished/typed-fields.ts';
import type { FinishedOf } from './finished.schema.ts';

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
type Finished = { [Name in BriefQuestion]: FinishedOf<Name> };

export type BriefOfAnswers =
  | { brief: Brief /** The id of the setting behind each letter, A first. */; settingOfLetter: string[] }
  | { problems: AnswerProblem[] };

function readBriefQuestions(answers: Answers): { finished: Finished } | { problems: AnswerProblem[] } {
  const finished: Partial<Record<BriefQuestion, unknown>> = {};
  const problems: AnswerProblem[] = [];
  for (const question of briefQuestions) {
    // What was decided about the hardest mixes follows the plan; an undecided one rules nothing out.
    const read = readFinished(question === 'look' ? decidedOnly(answers) : answers, question);
    if ('problems' in read) problems.push(...read.problems);
    else finished[question] = read.value;
  }
  return problems.length > 0 ? { problems } : { finished: finished as Finished };
}

function decidedOnly(answers: Answers): Answers {
  const mixes = answers.look?.mixes.filter(({ decision }) => decision !== undefined) ?? [];
  return { ...answers, look: { mixes } };
}

/** What is wrong with answers that are each right by themselves. */
function problemsBetween(finished: Finished): AnswerProblem[] {
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

function listRules({ neverRun, look }: Finished, settingIds: readonly string[]): ForbiddenRule[] {
  const never = neverRun.mixes.map(({ parts }) => toRule(parts, settingIds));
  const ruledOut = look.mixes
    .filter(({ decision }) => decision === 'ruledOut')
    .map(({ ends }) =>
      toRule(
        Object.entries(ends).map(([setting, end]) => ({ setting, end })),
        settingIds,
      ),
    );
  return [...never, ...ruledOut].filter((rule) => rule !== null);
}

/**
 * What the answers say, as the core reads it, with mixes that were ruled out on the last page among the forbidden ones.
 * It has the right shape and its figures agree; whether a plan fits it is for `proposePlans` to say.
 */
export function toBrief(answers: Answers): BriefOfAnswers {
  const read = readBriefQuestions(answers);
  if ('problems' in read) return read;
  const { finished } = read;
  const problems = problemsBetween(finished);
  if (problems.length > 0) return { problems };
  const { result, measuring, usual, worth, limit, watch, settings, around, spare } = finished;
  const settingOfLetter = settings.settings.map(({ id }) => id);
  const { partsPerRun, gaugeStep } = measuring;
  const blocks = toBlocks(around);
  const brief: Brief = {
    response: toResponse(result, {
      limits: limit,
      usual: usualFigure(usual),
      worth: worth.change,
      partsPerRun,
      gaugeStep,
    }),
    watch: watch.results.map((watched) => toResponse(watched, { limits: watched, usual: watched.usual })),
    factors: settings.settings.map(toFactor),
    forbidden: listRules(finished, settingOfLetter),
    ...(blocks ? { blocks } : {}),
    budget: toBudget(spare, measuring),
    noise: toNoise(usual, result),
  };
  return { brief, settingOfLetter };
}
