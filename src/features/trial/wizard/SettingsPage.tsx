import { useTranslation } from 'react-i18next';
import { ExampleNote } from './ExampleNote.tsx';
import { SettingsPart } from './SettingsPart.tsx';
import { StepHead } from './StepHead.tsx';
import { WizardFrame } from './WizardFrame.tsx';
import type { WizardPageProps } from './wizard-page.ts';

function SettingsQuestions() {
  const { t } = useTranslation('wizard');
  return (
    <>
      <StepHead title={t('settings.title')} help={t('settings.help')} />
      <ExampleNote step="settings" />
      <SettingsPart />
    </>
  );
}

/** What can you change? */
export function SettingsPage(props: WizardPageProps) {
  return (
    <WizardFrame {...props} step="settings">
      <SettingsQuestions />
    </WizardFrame>
  );
}
