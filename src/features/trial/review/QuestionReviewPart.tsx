import { useTranslation } from 'react-i18next';
import { formatsFor } from '../../../i18n/format.ts';
import type { Language } from '../../../i18n/languages.ts';
import { panelNameOf } from '../wizard/setting-words.ts';
import { type SummaryInput, settingWords, summaryOf } from '../wizard/start/summary-words.ts';
import { Lines } from './Lines.tsx';
import { ReviewLine } from './ReviewLine.tsx';
import { ReviewPart } from './ReviewPart.tsx';
import { useReview } from './review-context.tsx';

const lines = [
  { line: 'result', step: 'problem', place: '#/result' },
  { line: 'today', step: 'today', place: '#/usual' },
  { line: 'around', step: 'around', place: '#/around' },
  { line: 'crew', step: 'crew', place: '#/crew' },
] as const;

/** The question and the settings as the supervisor put them. */
export function QuestionReviewPart() {
  const { t, i18n } = useTranslation('plan-review');
  const { t: tWizard } = useTranslation('wizard-safety');
  const { t: tSafety } = useTranslation('safety');
  const { t: tFrame } = useTranslation('wizard-frame');
  const { answers, shop, trial } = useReview();
  const language = i18n.language as Language;
  const { list } = formatsFor(language, shop.timeZone);
  const input: SummaryInput = {
    answers,
    plan: trial.plan,
    shop,
    t: tWizard,
    tSafety,
    tFrame,
    list,
    language,
  };
  return (
    <>
      <ReviewPart title={t('part.question')}>
        {lines.map(({ line, step, place }) => (
          <ReviewLine key={line} label={t(`line.${line}`)} place={place}>
            <Lines of={summaryOf(step, input)} />
          </ReviewLine>
        ))}
      </ReviewPart>
      <ReviewPart title={t('part.settings')}>
        {(answers.settings?.settings ?? []).map((setting, place) => (
          <ReviewLine key={setting.id} label={panelNameOf(setting)} place={`#/settings/settings/${place}`}>
            <Lines of={settingWords(setting, tWizard)} />
          </ReviewLine>
        ))}
      </ReviewPart>
    </>
  );
}
