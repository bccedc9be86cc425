import { useTranslation } from 'react-i18next';
import { Callout } from '../../../components/ui/Callout.tsx';
import { formatsFor } from '../../../i18n/format.ts';
import type { Language } from '../../../i18n/languages.ts';
import { panelNameOf } from '../wizard/setting-words.ts';
import { auditLines } from './audit-lines.ts';
import { Lines } from './Lines.tsx';
import { ReviewLine } from './ReviewLine.tsx';
import { ReviewPart } from './ReviewPart.tsx';
import { RunOrder } from './RunOrder.tsx';
import { useReview } from './review-context.tsx';

/** The plan in the field's own terms: what it can and cannot tell apart, and how small an effect it would show. */
export function AuditPart() {
  const { t, i18n } = useTranslation('plan-review');
  const { answers, shop, trial } = useReview();
  const { plan } = trial;
  if (!plan) return <Callout tone="caution">{t('noPlan')}</Callout>;
  const formats = formatsFor(i18n.language as Language, shop.timeZone);
  const settings = plan.settingIds.map((id) => answers.settings?.settings.find((each) => each.id === id));
  const factors = settings.map((setting, place) =>
    t('audit.factor', {
      letter: String.fromCharCode(65 + place),
      name: setting ? panelNameOf(setting) : (plan.settingIds[place] ?? ''),
    }),
  );
  const unit = answers.result?.unit?.trim() ?? '';
  const worth = `${answers.worth?.change?.trim() ?? ''}`;
  return (
    <ReviewPart title={t('part.audit')}>
      <ReviewLine label={t('audit.factors')} place="#/plan/factors">
        <Lines of={factors} />
      </ReviewLine>
      {auditLines(plan.proposal, { t, formats, unit, worth }).map(({ key, label, lines }) => (
        <ReviewLine key={key} label={label} place={`#/plan/${key}`}>
          <div className="figures">
            <Lines of={lines} />
          </div>
        </ReviewLine>
      ))}
      <ReviewLine label={t('audit.order')} place="#/plan/order">
        <RunOrder plan={plan} names={settings.map((setting) => (setting ? panelNameOf(setting) : ''))} />
      </ReviewLine>
    </ReviewPart>
  );
}
