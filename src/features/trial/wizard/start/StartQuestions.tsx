import { useTranslation } from 'react-i18next';
import { StepHead } from '../StepHead.tsx';
import { useWizard } from '../wizard-context.ts';
import { LookPart } from './LookPart.tsx';
import { ReadyPart } from './ReadyPart.tsx';
import { StandingCallout } from './StandingCallout.tsx';
import { StartFault } from './StartFault.tsx';
import { StartSummary } from './StartSummary.tsx';
import { goesToEngineer, useStanding } from './standing.tsx';
import { listGaps } from './start-gaps.ts';

/** All answers on one page, the hardest runs, and what must be ready. */
export function StartQuestions() {
  const { t } = useTranslation('wizard-safety');
  const { answers, shop, mayWrite } = useWizard();
  const { now, isChecked } = useStanding();
  const isSending = goesToEngineer(now);
  const gaps = listGaps(answers, { plan: now.plan, people: shop.people, isSending });
  return (
    <>
      <StepHead title={t('start.title')} help={t('start.help')} />
      <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
        <StandingCallout />
        <StartSummary gaps={gaps} />
        <LookPart isChecked={isChecked} />
        <ReadyPart isChecked={isChecked && mayWrite && !isSending} />
        <StartFault gapCount={gaps.length} />
      </div>
    </>
  );
}
