import type { FieldProblem } from '../../i18n/field-codes.ts';
import { fieldProblems } from '../../i18n/field-problems.ts';
import type { Answers, QuestionName } from './answers.schema.ts';
import { contentOf, type FinishedOf, finishedSchemas } from './finished.schema.ts';

/** What keeps an answer from being used: the question, the field within it (JSON pointer) and what is wrong. */
export interface AnswerProblem extends FieldProblem {
  question: QuestionName;
}

/** The values of an answer, or what is wrong with it. */
export function readFinished<Name extends QuestionName>(
  answers: Answers,
  question: Name,
): { value: FinishedOf<Name> } | { problems: AnswerProblem[] } {
  const parsed = finishedSchemas[question].safeParse(contentOf(answers, question), { reportInput: true });
  if (parsed.success) return { value: parsed.data as FinishedOf<Name> };
  return { problems: fieldProblems(parsed.error).map((problem) => ({ question, ...problem })) };
}
