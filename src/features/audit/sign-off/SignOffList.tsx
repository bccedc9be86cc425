import type { PublicReview } from '../../trial/review.schema.ts';
import type { AuditWording } from '../audit-wording.ts';
import { auditAddress } from '../frame/audit-parts.ts';

interface Props extends AuditWording {
  readonly trialId: string;
  readonly reviews: readonly PublicReview[];
  readonly current: PublicReview['subject'] | null;
}

/** Plan, verdict and adoption with how each stands. */
export function SignOffList({ trialId, reviews, current, t, formats }: Props) {
  if (reviews.length === 0) return <p>{t('audit-review:none')}</p>;
  return (
    <ul className="audit-lines">
      {reviews.map(({ id, subject, state, holds, round, askedBy, askedAt, decidedBy, decidedAt }) => {
        const lapsed = state === 'approved' && !holds;
        const who = decidedBy ?? askedBy;
        const standing = t(`audit-review:state.${lapsed ? 'reopened' : state}`);
        return (
          <li key={id}>
            <a
              href={`${auditAddress(trialId, 'sign-off')}?subject=${subject}`}
              aria-current={subject === current ? 'true' : undefined}
            >
              {t(`audit-review:subject.${subject}`)}
            </a>
            {`: ${standing} \u00b7 ${t('audit-review:round', { round })} \u00b7 ${who} \u00b7 ${formats.dateTime(decidedAt ?? askedAt)}`}
          </li>
        );
      })}
    </ul>
  );
}
