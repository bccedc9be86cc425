import type { ResourceLanguage } from 'i18next';
import { useTranslation } from 'react-i18next';
import { IslandRoot } from '../../components/island/IslandRoot.tsx';
import { useSubmission } from '../../components/island/use-submission.ts';
import { Button } from '../../components/ui/Button.tsx';
import type { Language } from '../../i18n/languages.ts';
import { FaultCallout } from '../people/FaultCallout.tsx';
import { trialEventCall } from '../trial/trial.queries.ts';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
  readonly trialId: string;
  readonly revision: number;
  /** How many of each kind. */
  readonly pairs: number;
}

/** Plans the check runs in one step; they go out like all others. */
export function CheckRunsButton({ language, words, ...rest }: Props) {
  return (
    <IslandRoot language={language} words={words}>
      <CheckRuns {...rest} />
    </IslandRoot>
  );
}

function CheckRuns({ trialId, revision, pairs }: Omit<Props, 'language' | 'words'>) {
  const { t } = useTranslation('verdict-page');
  const { busy, fault, submit } = useSubmission();
  const plan = () =>
    submit(async () => {
      await trialEventCall(trialId, { event: 'plan check runs', revision, pairs });
      window.location.reload();
    });
  return (
    <>
      <Button kind="primary" busy={busy} busyLabel={t('decide.saving')} onClick={plan}>
        {t('decide.check', { count: 2 * pairs })}
      </Button>
      <FaultCallout fault={fault} />
    </>
  );
}
