import { SafetyQuestions } from './safety/SafetyQuestions.tsx';
import { WizardFrame } from './WizardFrame.tsx';
import type { WizardPageProps } from './wizard-page.ts';

/** What could go wrong? */
export function SafetyPage(props: WizardPageProps) {
  return (
    <WizardFrame {...props} step="safety">
      <SafetyQuestions />
    </WizardFrame>
  );
}
