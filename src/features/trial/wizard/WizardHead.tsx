import type { ResourceLanguage } from 'i18next';
import { useSyncExternalStore } from 'react';
import { useTranslation } from 'react-i18next';
import { IslandRoot } from '../../../components/island/IslandRoot.tsx';
import { Stepper } from '../../../components/ui/Stepper.tsx';
import { formatsFor } from '../../../i18n/format.ts';
import type { Language } from '../../../i18n/languages.ts';
import { type WizardStep, wizardSteps } from '../questions.ts';
import { type HeadNews, readHeadNews, subscribeHeadNews } from './head-news.ts';
import type { StepStates } from './step-states.ts';
import type { SaveState } from './stored-answers.ts';
import { addressOf } from './wizard-page.ts';

interface IslandProps {
  language: Language;
  words: ResourceLanguage;
}

function useHeadNews(): HeadNews | null {
  return useSyncExternalStore(subscribeHeadNews, readHeadNews, () => null);
}

interface StatusProps extends IslandProps {
  timeZone: string;
  savedAt: number | null;
  mayWrite: boolean;
}

const tones = {
  saved: 'text-good',
  saving: 'text-steel',
  undecided: 'text-caution',
  offline: 'text-caution',
  'signed out': 'text-caution',
  refused: 'text-stop',
} as const satisfies Record<SaveState['kind'], string>;

function StatusWords({ timeZone, savedAt, mayWrite, language }: Omit<StatusProps, 'words'>) {
  const { t } = useTranslation('wizard-frame');
  const save = useHeadNews()?.save ?? { kind: 'saved', at: savedAt };
  if (!mayWrite) return <span>{t('status.readOnly')}</span>;
  const words = {
    saved: () => {
      const at = save.kind === 'saved' ? save.at : null;
      return at === null ? '' : t('status.saved', { time: formatsFor(language, timeZone).time(at) });
    },
    saving: () => t('status.saving'),
    undecided: () => t('status.undecided'),
    offline: () => t('status.offline'),
    'signed out': () => t('status.signedOut'),
    refused: () => (save.kind === 'refused' ? t('status.refused', { why: save.sentence }) : ''),
  } as const satisfies Record<SaveState['kind'], () => string>;
  return (
    <span role="status" className={`whitespace-normal ${tones[save.kind]}`}>
      {words[save.kind]()}
    </span>
  );
}

/** Whether what was typed is safe, in a few words beside the trial's name. */
export function WizardStatus({ language, words, ...status }: StatusProps) {
  return (
    <IslandRoot language={language} words={words}>
      <StatusWords language={language} {...status} />
    </IslandRoot>
  );
}

interface StepsProps extends IslandProps {
  trialId: string;
  step: WizardStep;
  states: StepStates;
}

function Steps({ trialId, step, states }: Omit<StepsProps, keyof IslandProps>) {
  const { t } = useTranslation('wizard-frame');
  const now = useHeadNews()?.steps ?? states;
  const steps = wizardSteps.map((name, place) => {
    const state = now[name];
    return {
      key: name,
      number: String(place + 1),
      label: t(`step.${name}`),
      state: name === step ? ('current' as const) : state,
      stateWord: state === 'open' ? undefined : t(`stepState.${state}`),
      href: state === 'open' ? undefined : addressOf(trialId, name),
    };
  });
  return <Stepper label={t('steps')} steps={steps} />;
}

/** The eight pages under the head: done, with a gap, or not seen yet. */
export function WizardSteps({ language, words, ...steps }: StepsProps) {
  return (
    <IslandRoot language={language} words={words}>
      <Steps {...steps} />
    </IslandRoot>
  );
}
