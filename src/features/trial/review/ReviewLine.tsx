import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Icon } from '../../../components/ui/Icon.tsx';
import { formatsFor } from '../../../i18n/format.ts';
import type { Language } from '../../../i18n/languages.ts';
import { AddRemark } from './AddRemark.tsx';
import { useReviewWork } from './review-context.tsx';

interface Props {
  readonly label: string;
  /** JSON pointer into what is looked at. */
  readonly place: string;
  readonly children: ReactNode;
}

/** One line of what is looked at, with what was remarked on it. */
export function ReviewLine({ label, place, children }: Props) {
  const { t, i18n } = useTranslation('plan-review');
  const { review, timeZone } = useReviewWork();
  const { dateTime } = formatsFor(i18n.language as Language, timeZone);
  const remarks = review?.comments.filter((comment) => comment.place === place) ?? [];
  return (
    <div className="review-line">
      <dt className="review-label">{label}</dt>
      <dd className="review-words">
        {children}
        {remarks.map(({ id, by, at, words, settledAt }) => (
          <p key={id} className="review-remark">
            <Icon name={settledAt === null ? 'caution' : 'tick'} size={20} />
            <span>
              <span className="font-semibold">{t('remark.by', { who: by, time: dateTime(at) })}</span>
              {settledAt !== null && <span className="text-steel"> ({t('remark.settled')})</span>}
              <br />
              {words}
            </span>
          </p>
        ))}
      </dd>
      {review?.mayDecide && review.state === 'asked' && <AddRemark label={label} place={place} />}
    </div>
  );
}
