import type { ResourceLanguage } from 'i18next';
import { useTranslation } from 'react-i18next';
import { IslandRoot } from '../../../components/island/IslandRoot.tsx';
import type { Language } from '../../../i18n/languages.ts';
import { ReviewActions } from '../../trial/review/ReviewActions.tsx';
import { ReviewLine } from '../../trial/review/ReviewLine.tsx';
import { ReviewPart } from '../../trial/review/ReviewPart.tsx';
import { ReviewStanding } from '../../trial/review/ReviewStanding.tsx';
import { ReviewWorkContext, useReviewWorkOf } from '../../trial/review/review-context.tsx';
import type { PublicReview } from '../../trial/review.schema.ts';
import type { SignOffPart } from './sign-off-line.ts';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
  readonly subject: PublicReview['subject'];
  readonly timeZone: string;
  readonly backHref: string;
  readonly review: PublicReview | null;
  readonly parts: readonly SignOffPart[];
}

function Lines({ subject, timeZone, backHref, review, parts }: Omit<Props, 'language' | 'words'>) {
  const { t } = useTranslation('audit-review');
  const work = useReviewWorkOf(review, { subject, timeZone, backHref });
  return (
    <ReviewWorkContext value={work}>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
        <ReviewStanding />
        {parts.map(({ title, lines }) => (
          <ReviewPart key={title} title={title}>
            {lines.map(({ place, label, words, href }) => (
              <ReviewLine key={place} label={label} place={place}>
                <p>{words}</p>
                {href !== null && (
                  <p>
                    <a href={href}>
                      {t('figures')}
                      <span className="sr-only">: {words}</span>
                    </a>
                  </p>
                )}
              </ReviewLine>
            ))}
          </ReviewPart>
        ))}
        <ReviewActions />
      </div>
    </ReviewWorkContext>
  );
}

/** A verdict, or its adoption, line by line for whoever signs it off: remark, approve, send back. */
export function VerdictReview({ language, words, ...rest }: Props) {
  return (
    <IslandRoot language={language} words={words}>
      <Lines {...rest} />
    </IslandRoot>
  );
}
