import type { ResourceLanguage } from 'i18next';
import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { IslandRoot } from '../../components/island/IslandRoot.tsx';
import { useSubmission } from '../../components/island/use-submission.ts';
import { Button } from '../../components/ui/Button.tsx';
import type { Language } from '../../i18n/languages.ts';
import { FaultCallout } from '../people/FaultCallout.tsx';
import type { FollowReason } from './follow-reason.ts';
import { nextTrialCall } from './verdict.queries.ts';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
  readonly trialId: string;
  readonly reasons: readonly FollowReason[];
}

/** Begins the trial that follows in one step, and leads to its settings. */
export function NextTrialButtons({ language, words, ...rest }: Props) {
  return (
    <IslandRoot language={language} words={words}>
      <NextTrials {...rest} />
    </IslandRoot>
  );
}

function NextTrials({ trialId, reasons }: Pick<Props, 'trialId' | 'reasons'>) {
  const { t } = useTranslation('verdict-page');
  const { busy, fault, submit } = useSubmission();
  // Made here, so that pressing again after a broken line begins one trial.
  const [ids] = useState(() => new Map(reasons.map((reason) => [reason, v7()])));
  const begin = (reason: FollowReason) =>
    submit(async () => {
      const { id } = await nextTrialCall(trialId, { id: ids.get(reason) ?? v7(), reason });
      window.location.assign(`/trials/${id}/settings`);
    });
  return (
    <div className="grid gap-3">
      <p>{t('follow.words')}</p>
      <FaultCallout fault={fault} />
      <div className="button-row">
        {reasons.map((reason) => (
          <Button
            key={reason}
            icon="plus"
            busy={busy}
            busyLabel={t('decide.saving')}
            onClick={() => begin(reason)}
          >
            {t(`follow.button.${reason}`)}
          </Button>
        ))}
      </div>
    </div>
  );
}
