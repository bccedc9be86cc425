import type { PublicAnswers } from '../saved-answers.schema.ts';
import { StartActions } from './start/StartActions.tsx';
import { StartQuestions } from './start/StartQuestions.tsx';
import { StandingContext, useStandingOf } from './start/standing.tsx';
import { WizardFrame } from './WizardFrame.tsx';
import type { WizardPageProps } from './wizard-page.ts';

interface Props extends Omit<WizardPageProps, 'mayWrite'> {
  /** The trial with its plan and its review. */
  readonly standing: PublicAnswers;
  /** Whether this reader plans and starts trials. */
  readonly isPlanner: boolean;
}

/** Check and start. */
export function StartPage({ standing, isPlanner, ...page }: Props) {
  const shared = useStandingOf(standing, { isPlanner, readerId: page.readerId });
  return (
    <StandingContext value={shared}>
      <WizardFrame {...page} mayWrite={shared.now.mayWrite} step="start" lastAction={<StartActions />}>
        <StartQuestions />
      </WizardFrame>
    </StandingContext>
  );
}
