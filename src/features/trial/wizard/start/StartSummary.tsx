import { useTranslation } from 'react-i18next';
import { formatsFor } from '../../../../i18n/format.ts';
import type { Language } from '../../../../i18n/languages.ts';
import type { AnswerProblem } from '../../answer-problem.ts';
import { type WizardStep, wizardSteps } from '../../questions.ts';
import type { PublicComment } from '../../review.schema.ts';
import { useWizard } from '../wizard-context.ts';
import { stepOfPlace } from './remark-place.ts';
import { SummaryLine } from './SummaryLine.tsx';
import { useStanding } from './standing.tsx';
import { gapsOfStep } from './start-gaps.ts';
import { summaryOf } from './summary-words.ts';

interface Props {
  readonly gaps: readonly AnswerProblem[];
}

const summedUp = wizardSteps.filter((step) => step !== 'start');

/** Every page in one line, with what is missing on it and what the engineer remarked, and the way back to it. */
export function StartSummary({ gaps }: Props) {
  const { t, i18n } = useTranslation('wizard-safety');
  const { t: tSafety } = useTranslation('safety');
  const { t: tFrame } = useTranslation('wizard-frame');
  const { answers, shop } = useWizard();
  const { now } = useStanding();
  const language = i18n.language as Language;
  const { list } = formatsFor(language, shop.timeZone);
  const remarks = now.review?.comments.filter(({ settledAt }) => settledAt === null) ?? [];

  function remarksOf(step: WizardStep): PublicComment[] {
    return remarks.filter(({ place }) => stepOfPlace(place) === step);
  }

  return (
    <ol className="sheet summary">
      {summedUp.map((step) => (
        <SummaryLine
          key={step}
          step={step}
          words={summaryOf(step, { answers, plan: now.plan, shop, t, tSafety, tFrame, list, language })}
          gaps={gapsOfStep(gaps, step)}
          remarks={remarksOf(step)}
        />
      ))}
    </ol>
  );
}
