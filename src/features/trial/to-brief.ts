import type { Brief, ForbiddenRule } from '../../lib/doe/index.ts';
import type { AnswerProblem } from './answer-problem.ts';
import type { Answers } from './answers.schema.ts';
import { type BriefAnswers, readBriefAnswers } from './brief/brief-answers.ts';
import { toBlocks, toBudget, toNoise, usualFigure } from './brief/brief-limits.ts';
import { toResponse } from './brief/brief-result.ts';
import { toFactor, toRule } from './brief/brief-settings.ts';

export type BriefOfAnswers =
  | { brief: Brief /** The id of the setting behind each letter, A first. */; settingOfLetter: string[] }
  | { problems: AnswerProblem[] };

function listRules({ neverRun, look }: BriefAnswers, settingIds: readonly string[]): ForbiddenRule[] {
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
  const read = readBriefAnswers(answers);
  if ('problems' in read) return read;
  const { finished } = read;
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
