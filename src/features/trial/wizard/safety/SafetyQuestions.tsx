import { useTranslation } from 'react-i18next';
import { StepHead } from '../StepHead.tsx';
import { CallPart } from './CallPart.tsx';
import { GoBackPart } from './GoBackPart.tsx';
import { HazardsPart } from './HazardsPart.tsx';
import { NeverRunPart } from './NeverRunPart.tsx';
import { PartsPart } from './PartsPart.tsx';
import { StopPart } from './StopPart.tsx';

/** What could go wrong, from what can hurt to the way back. */
export function SafetyQuestions() {
  const { t } = useTranslation('wizard-safety');
  return (
    <>
      <StepHead title={t('safety.title')} help={t('safety.help')} />
      <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
        <HazardsPart />
        <StopPart />
        <CallPart />
        <NeverRunPart />
        <PartsPart />
        <GoBackPart />
      </div>
    </>
  );
}
