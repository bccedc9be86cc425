import type { ResourceLanguage } from 'i18next';
import { IslandRoot } from '../../../components/island/IslandRoot.tsx';
import type { Language } from '../../../i18n/languages.ts';
import type { PublicAnswers } from '../saved-answers.schema.ts';
import type { WizardShop } from '../wizard/wizard-context.ts';
import { AuditPart } from './AuditPart.tsx';
import { HardestPart } from './HardestPart.tsx';
import { QuestionReviewPart } from './QuestionReviewPart.tsx';
import { ReviewActions } from './ReviewActions.tsx';
import { ReviewStanding } from './ReviewStanding.tsx';
import { ReviewContext, ReviewWorkContext, useReviewOf } from './review-context.tsx';
import { SafetyReviewPart } from './SafetyReviewPart.tsx';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
  readonly first: PublicAnswers;
  readonly shop: WizardShop;
}

function Review({ first, shop }: Pick<Props, 'first' | 'shop'>) {
  const review = useReviewOf(first, shop);
  return (
    <ReviewContext value={review}>
      <ReviewWorkContext value={review}>
        <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
          <ReviewStanding />
          <QuestionReviewPart />
          <SafetyReviewPart />
          <HardestPart />
          <AuditPart />
          <ReviewActions />
        </div>
      </ReviewWorkContext>
    </ReviewContext>
  );
}

/** What the engineer or the safety person sees of a plan before it runs: the supervisor's words, and what stands behind them. */
export function PlanReview({ language, words, first, shop }: Props) {
  return (
    <IslandRoot language={language} words={words}>
      <Review first={first} shop={shop} />
    </IslandRoot>
  );
}
