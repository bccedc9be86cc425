import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { Button } from '../../../../components/ui/Button.tsx';
import { ConfirmDialog } from '../../../../components/ui/ConfirmDialog.tsx';
import { decideReviewCall, readAnswersCall, trialEventCall } from '../../trial.queries.ts';
import { takesAnswers } from '../../trial-states.ts';
import { useWizard } from '../wizard-context.ts';
import { goesToEngineer, useStanding } from './standing.tsx';
import { listGaps } from './start-gaps.ts';

const firstGap =
  'main [data-gap], main .choice-invalid input, main .hard-run input, main [id^="ready-"]:not(:checked)';

/** What leads on from the last page: to the engineer, to the machine, or back from the engineer. */
export function StartActions() {
  const { t } = useTranslation('wizard-safety');
  const { answers, shop, trialId, flush } = useWizard();
  const { now, isPlanner, work, run, setChecked } = useStanding();
  const [asking, setAsking] = useState(false);
  const { state } = now;
  if (!isPlanner) return null;

  if (state === 'plan review') {
    const takeBack = () =>
      run('take back', async (present) => {
        if (present.review) await decideReviewCall(present.review, 'take-back');
        return readAnswersCall(trialId);
      });
    return (
      <Button busy={work === 'take back'} busyLabel={t('start.takingBack')} onClick={takeBack} wide="phone">
        {t('start.takeBack')}
      </Button>
    );
  }
  if (!takesAnswers(state)) return null;

  const isSending = goesToEngineer(now);
  const event = isSending ? 'send for review' : 'start';
  const words = isSending
    ? { now: t('start.send'), busy: t('start.sending') }
    : { now: t('start.start'), busy: t('start.starting') };

  function press(): void {
    if (listGaps(answers, { plan: now.plan, people: shop.people, isSending }).length > 0) {
      setChecked(true);
      requestAnimationFrame(() => document.querySelector<HTMLElement>(firstGap)?.focus());
      return;
    }
    if (isSending) void go();
    else setAsking(true);
  }
  async function go(): Promise<void> {
    await flush();
    await run(isSending ? 'send' : 'start', ({ revision }) => trialEventCall(trialId, { event, revision }));
    setAsking(false);
  }

  return (
    <>
      <Button
        kind="primary"
        wide="phone"
        busy={work === 'send' || work === 'start'}
        busyLabel={words.busy}
        onClick={press}
      >
        {words.now}
      </Button>
      <ConfirmDialog
        open={asking}
        title={t('start.askTitle')}
        confirmLabel={t('start.start')}
        busyLabel={t('start.starting')}
        cancelLabel={t('start.cancel')}
        closeLabel={t('start.close')}
        busy={work === 'start'}
        onConfirm={() => void go()}
        onCancel={() => setAsking(false)}
      >
        {t('start.fixed')}
      </ConfirmDialog>
    </>
  );
}
