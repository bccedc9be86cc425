import { useTranslation } from 'react-i18next';
import { Callout } from '../../../components/ui/Callout.tsx';
import { questionsOf, type WizardStep } from '../questions.ts';
import { starterAnswers } from '../starters.ts';
import { sameContent } from './stored-answers.ts';
import { useWizard } from './wizard-context.ts';

/** Stands above figures that a starter put there, until somebody has changed them to the machine at hand. */
export function ExampleNote({ step }: { readonly step: WizardStep }) {
  const { t } = useTranslation('starters');
  const { answers } = useWizard();
  const starter = answers.job?.starter;
  if (!starter) return null;
  const examples = starterAnswers(starter, t);
  const isExample = questionsOf[step].some(
    (question) => examples[question] !== undefined && sameContent(answers[question], examples[question]),
  );
  if (!isExample) return null;
  return (
    <div className="mb-4">
      <Callout tone="info">{t('examples')}</Callout>
    </div>
  );
}
