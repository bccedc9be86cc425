import { useTranslation } from 'react-i18next';
import { JobTagSettings } from '../../../components/ui/JobTagSettings.tsx';
import { formatsFor } from '../../../i18n/format.ts';
import type { Language } from '../../../i18n/languages.ts';
import { decisionOn } from '../readiness.ts';
import { mixParts } from '../wizard/setting-words.ts';
import { mixKey, ruledOutMixes } from '../wizard/start/look-mixes.ts';
import { tagSettingsOf } from '../wizard/tag-settings.tsx';
import { Lines } from './Lines.tsx';
import { ReviewLine } from './ReviewLine.tsx';
import { ReviewPart } from './ReviewPart.tsx';
import { useReview } from './review-context.tsx';

/** The hardest runs of the plan with what the supervisor said to each. */
export function HardestPart() {
  const { t, i18n } = useTranslation('plan-review');
  const { t: tWizard } = useTranslation('wizard-safety');
  const { answers, shop, trial } = useReview();
  const formats = formatsFor(i18n.language as Language, shop.timeZone);
  const { plan } = trial;
  if (!plan) return null;
  const settings = answers.settings?.settings ?? [];
  const gone = ruledOutMixes(answers.look ?? { mixes: [] }, plan.hardest);
  return (
    <ReviewPart title={t('part.hardest')}>
      {plan.hardest.map(({ order, ends }) => {
        const decision = decisionOn(answers, { ends });
        const said = decision ? tWizard(`start.decision.${decision}`) : t('undecided');
        return (
          <ReviewLine
            key={mixKey(ends)}
            label={t('line.run', { number: order })}
            place={`#/plan/runs/${order - 1}`}
          >
            <div className="review-run">
              <JobTagSettings settings={tagSettingsOf(plan, order, settings, formats)} />
            </div>
            <p className="font-semibold">{said}</p>
          </ReviewLine>
        );
      })}
      {gone.length > 0 && (
        <ReviewLine label={t('ruledOut')} place="#/look">
          <Lines of={gone.map(({ ends }) => formats.list(mixParts(ends, settings)))} />
        </ReviewLine>
      )}
    </ReviewPart>
  );
}
