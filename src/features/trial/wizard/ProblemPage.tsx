import { useTranslation } from 'react-i18next';
import { JobPart } from './JobPart.tsx';
import { MeasuringPart } from './MeasuringPart.tsx';
import { ResultPart } from './ResultPart.tsx';
import { StepHead } from './StepHead.tsx';
import { WizardFrame } from './WizardFrame.tsx';
import type { WizardPageProps } from './wizard-page.ts';

function ProblemQuestions() {
  const { t } = useTranslation('wizard');
  return (
    <>
      <StepHead title={t('problem.title')} help={t('problem.help')} />
      <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
        <JobPart />
        <ResultPart />
        <MeasuringPart />
      </div>
    </>
  );
}

/** What is wrong? */
export function ProblemPage(props: WizardPageProps) {
  return (
    <WizardFrame {...props} step="problem">
      <ProblemQuestions />
    </WizardFrame>
  );
}
