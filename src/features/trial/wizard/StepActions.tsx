import { type MouseEvent, type ReactNode, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { ActionBar } from '../../../components/ui/ActionBar.tsx';
import { ButtonLink } from '../../../components/ui/ButtonLink.tsx';
import { type WizardStep, wizardSteps } from '../questions.ts';
import { addressOf } from './wizard-page.ts';

interface Props {
  readonly trialId: string;
  readonly step: WizardStep;
  readonly lastAction: ReactNode;
  readonly beforeLeaving: (() => Promise<void>) | undefined;
}

/** Longer than a save takes; without a connection the answers wait in the browser. */
const mostPatience = 1_200;

/** Back and on. Gaps never hold anybody up: they stay marked above. */
export function StepActions({ trialId, step, lastAction, beforeLeaving }: Props) {
  const { t } = useTranslation('wizard-frame');
  const [isLeaving, setLeaving] = useState(false);
  const place = wizardSteps.indexOf(step);
  const [back, next] = [wizardSteps[place - 1], wizardSteps[place + 1]];

  async function leave(event: MouseEvent<HTMLAnchorElement>): Promise<void> {
    const isPlain = !event.metaKey && !event.ctrlKey && !event.shiftKey && event.button === 0;
    if (!beforeLeaving || !isPlain) return;
    const { href } = event.currentTarget;
    event.preventDefault();
    if (isLeaving) return;
    setLeaving(true);
    await Promise.race([beforeLeaving(), new Promise((done) => setTimeout(done, mostPatience))]);
    location.assign(href);
  }

  return (
    <ActionBar
      secondary={
        back && (
          <ButtonLink href={addressOf(trialId, back)} onClick={leave}>
            {t('back')}
          </ButtonLink>
        )
      }
    >
      {lastAction}
      {next && (
        <ButtonLink kind="primary" href={addressOf(trialId, next)} onClick={leave}>
          {t('next')}
        </ButtonLink>
      )}
    </ActionBar>
  );
}
