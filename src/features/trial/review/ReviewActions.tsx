import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { ActionBar } from '../../../components/ui/ActionBar.tsx';
import { Button } from '../../../components/ui/Button.tsx';
import { ButtonLink } from '../../../components/ui/ButtonLink.tsx';
import { Callout } from '../../../components/ui/Callout.tsx';
import { ConfirmDialog } from '../../../components/ui/ConfirmDialog.tsx';
import { decideReviewCall } from '../trial.queries.ts';
import { useReviewWork } from './review-context.tsx';

/** Approve, or send back with at least one remark; neither for whoever asked. */
export function ReviewActions() {
  const { t } = useTranslation('plan-review');
  const { subject, backHref, review, work, run } = useReviewWork();
  const [asking, setAsking] = useState(false);
  const [lacksRemark, setLacksRemark] = useState(false);
  const mayDecide = review?.state === 'asked' && review.mayDecide;
  const openRemarks = review?.comments.filter(({ settledAt }) => settledAt === null).length ?? 0;

  async function approve(): Promise<void> {
    await run('approve', (present) => decideReviewCall(present, 'approve'));
    setAsking(false);
  }
  function sendBack(): void {
    setLacksRemark(openRemarks === 0);
    if (openRemarks > 0) void run('send-back', (present) => decideReviewCall(present, 'send-back'));
  }

  return (
    <>
      <ReviewFault />
      {lacksRemark && openRemarks === 0 && (
        <Callout tone="caution" live="assertive">
          {t('needsRemark')}
        </Callout>
      )}
      <ActionBar secondary={<ButtonLink href={backHref}>{t('back')}</ButtonLink>}>
        {mayDecide && (
          <>
            <Button busy={work === 'send-back'} busyLabel={t('sendingBack')} onClick={sendBack}>
              {t('sendBack')}
            </Button>
            <Button kind="primary" onClick={() => setAsking(true)}>
              {t('approve')}
            </Button>
          </>
        )}
      </ActionBar>
      <ConfirmDialog
        open={asking}
        title={t(`approveTitle.${subject}`)}
        confirmLabel={t('approve')}
        busyLabel={t('approving')}
        cancelLabel={t('cancel')}
        closeLabel={t('close')}
        busy={work === 'approve'}
        onConfirm={() => void approve()}
        onCancel={() => setAsking(false)}
      >
        {t(`approveWords.${subject}`)}
      </ConfirmDialog>
    </>
  );
}

function ReviewFault() {
  const { t } = useTranslation('plan-review');
  const { fault } = useReviewWork();
  if (!fault) return null;
  const words = {
    offline: () => t('offline'),
    'signed out': () => t('signedOut'),
    refused: () => (fault.kind === 'refused' ? fault.problem.detail : ''),
  }[fault.kind]();
  return (
    <Callout tone="caution" title={t('fault')} live="assertive">
      {words}
    </Callout>
  );
}
