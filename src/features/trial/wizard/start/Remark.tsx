import { useTranslation } from 'react-i18next';
import { Button } from '../../../../components/ui/Button.tsx';
import { Callout } from '../../../../components/ui/Callout.tsx';
import type { PublicComment } from '../../review.schema.ts';
import { settleCommentCall } from '../../trial.queries.ts';
import { useWizard } from '../wizard-context.ts';
import { useStanding } from './standing.tsx';

interface Props {
  readonly remark: PublicComment;
}

/** What the engineer remarked on this line; whoever has dealt with it says so. */
export function Remark({ remark }: Props) {
  const { t } = useTranslation('wizard-safety');
  const { mayWrite } = useWizard();
  const { run, work } = useStanding();
  const { id, words, by } = remark;
  const settle = () =>
    run('settle', async (now) => {
      if (!now.review) return now;
      return { ...now, review: await settleCommentCall(now.review.id, { id, settled: true }) };
    });
  return (
    <Callout
      tone="caution"
      actions={
        mayWrite && (
          <Button icon="tick" disabled={work !== null} onClick={settle}>
            {t('start.settled')}
          </Button>
        )
      }
    >
      {t('start.remark', { who: by, words })}
    </Callout>
  );
}
