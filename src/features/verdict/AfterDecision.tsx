import type { ResourceLanguage } from 'i18next';
import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { IslandRoot } from '../../components/island/IslandRoot.tsx';
import { useSubmission } from '../../components/island/use-submission.ts';
import { Button } from '../../components/ui/Button.tsx';
import { TextArea } from '../../components/ui/TextArea.tsx';
import type { Language } from '../../i18n/languages.ts';
import { FaultCallout } from '../people/FaultCallout.tsx';
import { trialEventCall } from '../trial/trial.queries.ts';
import { checkBackCall } from './verdict.queries.ts';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
  readonly trialId: string;
  readonly revision: number;
  /** Whether new settings are in use, so that it can be said how they hold. */
  readonly inUse: boolean;
  readonly mayOpen: boolean;
}

/** What can be done with a closed trial: say how its settings hold, or open it again. */
export function AfterDecision({ language, words, ...rest }: Props) {
  return (
    <IslandRoot language={language} words={words}>
      {rest.inUse && <CheckBack trialId={rest.trialId} />}
      {rest.mayOpen && <OpenAgain trialId={rest.trialId} revision={rest.revision} />}
    </IslandRoot>
  );
}

function CheckBack({ trialId }: Pick<Props, 'trialId'>) {
  const { t } = useTranslation('verdict-page');
  const [note, setNote] = useState('');
  const { busy, fault, submit } = useSubmission();
  const say = (holds: boolean) =>
    submit(async () => {
      await checkBackCall(trialId, { holds, note });
      window.location.reload();
    });
  return (
    <section className="sheet verdict-decide" aria-labelledby="does-it-hold">
      <h2 id="does-it-hold">{t('checkBack.title')}</h2>
      <p>{t('checkBack.words')}</p>
      <TextArea
        id="check-back-note"
        label={t('decide.note')}
        value={note}
        maxLength={1000}
        onChange={(event) => setNote(event.currentTarget.value)}
      />
      <FaultCallout fault={fault} />
      <div className="button-row">
        <Button busy={busy} busyLabel={t('decide.saving')} onClick={() => say(false)}>
          {t('checkBack.no')}
        </Button>
        <Button busy={busy} busyLabel={t('decide.saving')} onClick={() => say(true)}>
          {t('checkBack.yes')}
        </Button>
      </div>
    </section>
  );
}

/** The shortest reason that may stand on record. */
const shortestReason = 3;

function OpenAgain({ trialId, revision }: Pick<Props, 'trialId' | 'revision'>) {
  const { t } = useTranslation('verdict-page');
  const [reason, setReason] = useState('');
  const [isAsked, setIsAsked] = useState(false);
  const { busy, fault, submit } = useSubmission();
  const isShort = reason.trim().length < shortestReason;
  const open = () => {
    setIsAsked(true);
    if (isShort) return;
    void submit(async () => {
      await trialEventCall(trialId, { event: 'open again', revision, reason });
      window.location.reload();
    });
  };
  return (
    <section className="sheet verdict-decide" aria-labelledby="open-again">
      <h2 id="open-again">{t('openAgain.title')}</h2>
      <p>{t('openAgain.words')}</p>
      <TextArea
        id="open-reason"
        label={t('openAgain.reason')}
        value={reason}
        maxLength={500}
        onChange={(event) => setReason(event.currentTarget.value)}
        error={isAsked && isShort ? t('decide.needsReason') : undefined}
      />
      <FaultCallout fault={fault} />
      <div className="button-row">
        <Button icon="repeat" busy={busy} busyLabel={t('decide.saving')} onClick={open}>
          {t('openAgain.button')}
        </Button>
      </div>
    </section>
  );
}
