import type { AnswerProblem } from '../../answer-problem.ts';
import type { Answers, QuestionName } from '../../answers.schema.ts';
import { missingAnswers, missingVersions } from '../../missing-answers.ts';
import type { PublicPlan } from '../../plan.schema.ts';
import { stepOf, type WizardStep } from '../../questions.ts';
import { crewLanguages } from '../safety/crew-languages.ts';
import type { CrewMember } from '../wizard-context.ts';
import { decisionOf } from './look-mixes.ts';

const planGap: AnswerProblem = { question: 'spare', pointer: '#', code: 'choose-plan' };

/** All that stands between the answers and a start, in the order of the pages, each once. */
export function listGaps(
  answers: Answers,
  plan: PublicPlan | null,
  people: readonly CrewMember[],
): AnswerProblem[] {
  const versions = missingVersions(answers, crewLanguages(answers, people));
  const undecided = plan?.hardest.filter(({ ends }) => decisionOf(answers.look, ends) === undefined) ?? [];
  return [
    ...missingAnswers(answers).filter(({ question }) => question !== 'look'),
    ...versions,
    ...(plan?.fits ? [] : [planGap]),
    ...undecided.map(
      ({ order }): AnswerProblem => ({ question: 'look', pointer: `#/${order}`, code: 'decide-mix' }),
    ),
  ];
}

/** The first gap of each question on a page: one line names it, its page shows the rest. */
export function gapsOfStep(gaps: readonly AnswerProblem[], step: WizardStep): AnswerProblem[] {
  const named = new Set<QuestionName>();
  return gaps.filter(({ question }) => {
    if (stepOf(question) !== step || named.has(question)) return false;
    named.add(question);
    return true;
  });
}
