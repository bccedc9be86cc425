import { useTranslation } from 'react-i18next';
import { CrewPart } from './crew/CrewPart.tsx';
import { PacePart } from './crew/PacePart.tsx';
import { TextsPart } from './crew/TextsPart.tsx';
import { StepHead } from './StepHead.tsx';
import { WizardFrame } from './WizardFrame.tsx';
import type { WizardPageProps } from './wizard-page.ts';

function CrewQuestions() {
  const { t } = useTranslation('wizard-plan');
  return (
    <>
      <StepHead title={t('crew.title')} help={t('crew.help')} />
      <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
        <CrewPart />
        <PacePart />
        <TextsPart />
      </div>
    </>
  );
}

/** Who and when? */
export function CrewPage(props: WizardPageProps) {
  return (
    <WizardFrame {...props} step="crew">
      <CrewQuestions />
    </WizardFrame>
  );
}
