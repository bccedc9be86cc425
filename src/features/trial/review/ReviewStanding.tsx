import { useTranslation } from 'react-i18next';
import { Callout } from '../../../components/ui/Callout.tsx';
import { formatsFor } from '../../../i18n/format.ts';
import type { Language } from '../../../i18n/languages.ts';
import { useReviewWork } from './review-context.tsx';

/** Who asked for a look, what became of it, and why this reader may or may not decide. */
export function ReviewStanding() {
  const { t, i18n } = useTranslation('plan-review');
  const { review, subject, timeZone } = useReviewWork();
  const { dateTime } = formatsFor(i18n.language as Language, timeZone);
  const decided = { who: review?.decidedBy ?? '', time: dateTime(review?.decidedAt ?? 0) };
  return (
    <div role="status" className="grid gap-2 empty:hidden">
      {review?.state === 'asked' && (
        <p>{t('asked', { who: review.askedBy, time: dateTime(review.askedAt), round: review.round })}</p>
      )}
      {review?.state === 'asked' && !review.mayDecide && (
        <Callout tone="info" title={t('ownTitle')}>
          {t('ownWords')}
        </Callout>
      )}
      {review?.state === 'approved' && review.holds && (
        <Callout tone="good">{t('approved', decided)}</Callout>
      )}
      {review?.state === 'sent back' && <Callout tone="caution">{t('sentBack', decided)}</Callout>}
      {review?.state !== 'asked' && !(review?.state === 'approved' && review.holds) && (
        <Callout tone="info" title={t('notAsked.title')}>
          {t(`notAsked.${subject}`)}
        </Callout>
      )}
    </div>
  );
}
