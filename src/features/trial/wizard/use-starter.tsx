import { useTranslation } from 'react-i18next';
import type { StarterName } from '../answer-choices.ts';
import type { Answers, QuestionName } from '../answers.schema.ts';
import { starterAnswers } from '../starters.ts';
import { sameContent } from './stored-answers.ts';
import { useFill } from './use-question-form.tsx';
import { useWizard } from './wizard-context.ts';

/** Whether a question may be filled: nothing stands there, or only what an earlier starter put there. */
function isFree(question: QuestionName, answers: Answers, before: Answers): boolean {
  const content = answers[question];
  return sameContent(content, undefined) || sameContent(content, before[question]);
}

/** Begins with a starter's answers. What somebody typed already stays as it is. */
export function useStarter(): (name: StarterName) => void {
  const { t } = useTranslation('starters');
  const { answers } = useWizard();
  const fill = useFill();
  return (name) => {
    const chosen = answers.job?.starter;
    const before = chosen ? starterAnswers(chosen, t) : {};
    const next = starterAnswers(name, t);
    const questions = new Set([...Object.keys(before), ...Object.keys(next)] as QuestionName[]);
    for (const question of questions) {
      if (question !== 'job' && isFree(question, answers, before)) fill(question, next[question]);
    }
    const named = answers.job?.title;
    const title = named && named !== before.job?.title ? named : next.job?.title;
    fill('job', { ...answers.job, title, starter: name });
  };
}
