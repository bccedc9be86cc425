import { Callout } from '../../../components/ui/Callout.tsx';
import type { Translate } from '../../../i18n/translator.ts';
import type { FollowReason } from '../follow-reason.ts';

interface Props {
  readonly t: Translate;
  readonly trial: { id: string; number: number; title: string };
  readonly reason: FollowReason;
}

/** Which trial this one follows, why, and so why its answers stand there already. */
export function FollowNote({ t, trial, reason }: Props) {
  return (
    <div className="mb-6">
      <Callout tone="info">
        {t('verdict-page:follow.after')}{' '}
        <a href={`/trials/${trial.id}/verdict`}>
          {t('verdict-page:follow.trial', { number: trial.number, title: trial.title })}
        </a>
        {`. ${t(`verdict-page:follow.why.${reason}`)} ${t('verdict-page:follow.check')}`}
      </Callout>
    </div>
  );
}
