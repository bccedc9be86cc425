import { useTranslation } from 'react-i18next';
import { PlanQuestions } from './plan/PlanQuestions.tsx';
import { StepHead } from './StepHead.tsx';
import { WizardFrame } from './WizardFrame.tsx';
import type { WizardPageProps } from './wizard-page.ts';

function PlanHead() {
  const { t } = useTranslation('wizard-plan');
  return <StepHead title={t('plan.title')} help={t('plan.help')} />;
}

/** Pick a plan. */
export function PlanPage(props: WizardPageProps) {
  return (
    <WizardFrame {...props} step="plan">
      <PlanHead />
      <PlanQuestions />
    </WizardFrame>
  );
}
