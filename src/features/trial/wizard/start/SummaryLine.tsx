import { useTranslation } from 'react-i18next';
import { Icon } from '../../../../components/ui/Icon.tsx';
import { fieldSentence } from '../../../../i18n/field-codes.ts';
import type { AnswerProblem } from '../../answer-problem.ts';
import { type WizardStep, wizardSteps } from '../../questions.ts';
import type { PublicComment } from '../../review.schema.ts';
import { useWizard } from '../wizard-context.ts';
import { addressOf, toDoHash } from '../wizard-page.ts';
import { Remark } from './Remark.tsx';

interface Props {
  readonly step: WizardStep;
  readonly words: readonly string[];
  readonly gaps: readonly AnswerProblem[];
  readonly remarks: readonly PublicComment[];
}

/** What was said on one page, what is missing there, and the way back to it. */
export function SummaryLine({ step, words, gaps, remarks }: Props) {
  const { t } = useTranslation('wizard-safety');
  const { t: tFrame } = useTranslation('wizard-frame');
  const { t: tErrors } = useTranslation('errors');
  const { trialId, mayWrite } = useWizard();
  const page = tFrame(`step.${step}`);
  const address = addressOf(trialId, step) + (gaps.length > 0 ? toDoHash : '');
  return (
    <li className="summary-line">
      <div className="summary-words">
        <h2 className="summary-page">
          <span className="figures">{wizardSteps.indexOf(step) + 1}</span> {page}
        </h2>
        {words.length === 0 && gaps.length === 0 && <p className="text-steel">{t('start.nothing')}</p>}
        {words.map((line) => (
          <p key={line}>{line}</p>
        ))}
        {gaps.map(({ question, pointer, code, values }) => (
          <p key={`${question} ${pointer}`} className="summary-gap">
            <Icon name="caution" />
            <span>
              {t('start.gap', {
                question: tFrame(`question.${question}`),
                fault: fieldSentence(
                  (key, filled) => tErrors(key.replace('errors:', '') as 'field.missing', filled),
                  code,
                  values,
                ),
              })}
            </span>
          </p>
        ))}
        {remarks.map((remark) => (
          <Remark key={remark.id} remark={remark} />
        ))}
      </div>
      {mayWrite && (
        <a className="summary-change" href={address} data-gap={gaps.length > 0 ? 'yes' : undefined}>
          <span aria-hidden="true">{t('start.change')}</span>
          <span className="sr-only">{t('start.changeStep', { page })}</span>
        </a>
      )}
    </li>
  );
}
