import { useTranslation } from 'react-i18next';
import { ExampleNote } from './ExampleNote.tsx';
import { GaugePart } from './GaugePart.tsx';
import { LimitPart } from './LimitPart.tsx';
import { StepHead } from './StepHead.tsx';
import { UsualPart } from './UsualPart.tsx';
import { ValuePart } from './ValuePart.tsx';
import { WatchPart } from './WatchPart.tsx';
import { WizardFrame } from './WizardFrame.tsx';
import { WorthPart } from './WorthPart.tsx';
import type { WizardPageProps } from './wizard-page.ts';

function TodayQuestions() {
  const { t } = useTranslation('wizard');
  return (
    <>
      <StepHead title={t('today.title')} help={t('today.help')} />
      <ExampleNote step="today" />
      <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
        <UsualPart />
        <WorthPart />
        <LimitPart />
        <WatchPart />
        <ValuePart />
        <GaugePart />
      </div>
    </>
  );
}

/** How is it today? */
export function TodayPage(props: WizardPageProps) {
  return (
    <WizardFrame {...props} step="today">
      <TodayQuestions />
    </WizardFrame>
  );
}
