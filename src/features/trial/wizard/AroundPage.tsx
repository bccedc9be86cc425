import { AroundQuestions } from './around/AroundQuestions.tsx';
import { WizardFrame } from './WizardFrame.tsx';
import type { WizardPageProps } from './wizard-page.ts';

/** What else could get in the way? */
export function AroundPage(props: WizardPageProps) {
  return (
    <WizardFrame {...props} step="around">
      <AroundQuestions />
    </WizardFrame>
  );
}
