import type { Answers, QuestionName } from '../answers.schema.ts';
import { contentOf, finishedSchemas } from '../finished.schema.ts';
import { questionsOf, type WizardStep, wizardSteps } from '../questions.ts';

/** `gap`: seen, and an answer is missing or does not fit. `open`: not seen yet. */
export type StepState = 'done' | 'gap' | 'open';
export type StepStates = Readonly<Record<WizardStep, StepState>>;

const counted = new WeakMap<object, number>();

/** How many fields of a question are missing or do not fit. */
export function countGaps(answers: Answers, question: QuestionName): number {
  const content = contentOf(answers, question) as object;
  const known = counted.get(content);
  if (known !== undefined) return known;
  const parsed = finishedSchemas[question].safeParse(content);
  const gaps = parsed.success ? 0 : parsed.error.issues.length;
  counted.set(content, gaps);
  return gaps;
}

export function countStepGaps(answers: Answers, step: WizardStep): number {
  return questionsOf[step].reduce((sum, question) => sum + countGaps(answers, question), 0);
}

/** The steps up to the last of these. */
export function seenSteps(shown: readonly string[]): WizardStep[] {
  const last = wizardSteps.findLastIndex((step) => shown.includes(step));
  return wizardSteps.slice(0, last + 1);
}

/** The steps with an answer: what was looked at, as far as one can tell on a device that has not shown the trial before. */
export function answeredSteps(answers: Answers): WizardStep[] {
  return wizardSteps.filter((step) => questionsOf[step].some((question) => answers[question] !== undefined));
}

export function stepStatesOf(answers: Answers, seen: readonly WizardStep[]): StepStates {
  const entries = wizardSteps.map((step) => {
    if (!seen.includes(step)) return [step, 'open'];
    return [step, countStepGaps(answers, step) > 0 ? 'gap' : 'done'];
  });
  return Object.fromEntries(entries) as StepStates;
}

/** What is still to do on the pages seen so far, and the first page to do it on. */
export function listToDo(
  answers: Answers,
  seen: readonly WizardStep[],
): { count: number; first: WizardStep | undefined } {
  const gaps = seen.map((step) => ({ step, count: countStepGaps(answers, step) }));
  return {
    count: gaps.reduce((sum, { count }) => sum + count, 0),
    first: gaps.find(({ count }) => count > 0)?.step,
  };
}
