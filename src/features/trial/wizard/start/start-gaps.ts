import type { AnswerProblem } from '../../answer-problem.ts';
import type { Answers, QuestionName } from '../../answers.schema.ts';
import { missingAnswers, missingVersions } from '../../missing-answers.ts';
import type { PublicPlan } from '../../plan.schema.ts';
import { stepOf, type WizardStep } from '../../questions.ts';
import { undecidedMixes } from '../../readiness.ts';
import { crewLanguages } from '../safety/crew-languages.ts';
import type { CrewMember } from '../wizard-context.ts';

const planGap: AnswerProblem = { question: 'spare', pointer: '#', code: 'choose-plan' };

interface Asked {
  plan: PublicPlan | null;
  people: readonly CrewMember[];
  /** An engineer looks before the machine is made ready. */
  isSending: boolean;
}

/** All that stands between the answers and a start, or sending them, in the order of the pages. */
export function listGaps(answers: Answers, { plan, people, isSending }: Asked): AnswerProblem[] {
  const versions = missingVersions(answers, crewLanguages(answers, people));
  const undecided = undecidedMixes(answers, plan?.hardest ?? []);
  return [
    ...missingAnswers(answers).filter(
      ({ question }) => question !== 'look' && !(isSending && question === 'ready'),
    ),
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
