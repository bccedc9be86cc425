import type { FieldProblem } from '../../i18n/field-codes.ts';
import type { AnswerProblem } from './answer-problem.ts';
import type { Answers } from './answers.schema.ts';
import type { HardMix } from './plan.schema.ts';

/** Problems of answers as the fields of a refusal: the question is the first part of the pointer. */
export function toFields(problems: readonly AnswerProblem[]): FieldProblem[] {
  return problems.map(({ question, pointer, code, values }) => ({
    pointer: `#/${question}${pointer.slice(1)}`,
    code,
    ...(values ? { values } : {}),
  }));
}

type Ends = HardMix['ends'];

export function sameEnds(one: Ends, other: Ends): boolean {
  const settings = Object.keys(one);
  return (
    settings.length === Object.keys(other).length &&
    settings.every((setting) => one[setting] === other[setting])
  );
}

/** What was decided about a mix; undefined: nothing yet. */
export function decisionOn(answers: Answers, mix: Pick<HardMix, 'ends'>) {
  return answers.look?.mixes.find(({ ends }) => sameEnds(ends, mix.ends))?.decision;
}

/** Whether each of the plan's hardest mixes was looked at, and none that stands was ruled out. */
export function undecidedMixes(answers: Answers, hardest: readonly HardMix[]): HardMix[] {
  return hardest.filter((mix) => {
    const decision = decisionOn(answers, mix);
    return decision === undefined || decision === 'ruledOut';
  });
}

/** Whether somebody left the word on one of the hardest mixes to the engineer. */
export function leavesToEngineer(answers: Answers, hardest: readonly HardMix[]): boolean {
  return hardest.some((mix) => decisionOn(answers, mix) === 'engineerAgrees');
}

/** Everybody who runs or measures, by their ids. */
export function crewOf(answers: Answers): { id: string; pointer: string }[] {
  const shifts = answers.crew?.shifts ?? [];
  return shifts.flatMap((shift, place) =>
    (['runs', 'measures'] as const).flatMap((part) => {
      const id = shift[part]?.trim() ?? '';
      return id === '' ? [] : [{ id, pointer: `#/shifts/${place}/${part}` }];
    }),
  );
}
