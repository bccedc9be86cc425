import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { Callout } from '../../../../components/ui/Callout.tsx';
import { Loading } from '../../../../components/ui/Loading.tsx';
import { readBriefAnswers } from '../../brief/brief-answers.ts';
import { stepOf, type WizardStep } from '../../questions.ts';
import { TrialFault } from '../../TrialFault.tsx';
import { QuestionPart } from '../QuestionPart.tsx';
import { useWizard } from '../wizard-context.ts';
import { addressOf, toDoHash } from '../wizard-page.ts';
import { MisfitCallout } from './MisfitCallout.tsx';
import { PlanCard } from './PlanCard.tsx';
import { RunCost } from './RunCost.tsx';
import { SpareSliders } from './SpareSliders.tsx';
import { useChosenPlan } from './use-chosen-plan.tsx';
import { useSpare } from './use-spare.tsx';

/** The pages with answers that a plan still needs, in their order. */
function useOpenSteps(): WizardStep[] {
  const { answers } = useWizard();
  const read = readBriefAnswers(answers);
  return 'problems' in read ? [...new Set(read.problems.map(({ question }) => stepOf(question)))] : [];
}

function OpenSteps({ steps }: { readonly steps: readonly WizardStep[] }) {
  const { t } = useTranslation('wizard-plan');
  const { t: tFrame } = useTranslation('wizard-frame');
  const { trialId } = useWizard();
  if (steps.length === 0) return null;
  return (
    <Callout tone="info" title={t('plan.openTitle')}>
      <ul className="flex flex-wrap gap-x-5">
        {steps.map((step) => (
          <li key={step}>
            <a className="inline-flex min-h-12 items-center" href={`${addressOf(trialId, step)}${toDoHash}`}>
              {tFrame(`step.${step}`)}
            </a>
          </li>
        ))}
      </ul>
    </Callout>
  );
}

/** What one can spare, and the plans that fit it. */
export function PlanQuestions() {
  const { t } = useTranslation('wizard-plan');
  const { soFar, mayWrite } = useWizard();
  const { brief, proposals, racks, misfit, missing } = soFar;
  const form = useSpare();
  const openSteps = useOpenSteps();
  const { plan, busy, fault, take } = useChosenPlan();
  const [taking, setTaking] = useState<string | null>(null);
  const isWorking = brief === null && missing === 0;
  const takeIt = (id: string) => {
    setTaking(id);
    void take(id);
  };

  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-6">
      <QuestionPart title={t('plan.spare')}>
        <SpareSliders form={form} />
        <RunCost form={form} />
      </QuestionPart>
      <OpenSteps steps={openSteps} />
      {plan && !plan.fits && openSteps.length === 0 && (
        <Callout tone="caution" title={t('plan.staleTitle')} live="polite">
          {t('plan.staleWords')}
        </Callout>
      )}
      <TrialFault fault={fault} />
      {isWorking && <Loading label={t('plan.working')} lines={4} />}
      {misfit && <MisfitCallout misfit={misfit} form={form} />}
      <p role="status" className={proposals.length > 0 ? 'text-steel' : 'sr-only'}>
        {proposals.length > 0 && t('plan.dealt', { count: proposals.length })}
      </p>
      {brief &&
        proposals.map((proposal, place) => (
          <PlanCard
            key={proposal.id}
            brief={brief}
            proposal={proposal}
            runs={racks[place] ?? []}
            isTaken={plan?.fits === true && plan.proposalId === proposal.id}
            busy={busy && taking === proposal.id}
            onTake={mayWrite && openSteps.length === 0 ? () => takeIt(proposal.id) : null}
          />
        ))}
    </div>
  );
}
