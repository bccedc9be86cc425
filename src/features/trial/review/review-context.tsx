import { createContext, useContext, useState } from 'react';
import { type SubmissionFault, useSubmission } from '../../../components/island/use-submission.ts';
import type { Answers } from '../answers.schema.ts';
import type { PublicReview } from '../review.schema.ts';
import type { PublicAnswers } from '../saved-answers.schema.ts';
import type { WizardShop } from '../wizard/wizard-context.ts';

/** A review that is worked on, whatever it is about. */
export interface ReviewWork {
  subject: PublicReview['subject'];
  timeZone: string;
  /** Where the way back leads. */
  backHref: string;
  review: PublicReview | null;
  work: string | null;
  fault: SubmissionFault | null;
  /** Does one thing at a time with the review that is asked for. Answers whether it was done. */
  run(work: string, call: (review: PublicReview) => Promise<PublicReview>): Promise<boolean>;
}

export interface ReviewValue extends ReviewWork {
  /** The trial as it was when the page was opened. */
  trial: PublicAnswers;
  answers: Answers;
  shop: WizardShop;
}

export const ReviewWorkContext = createContext<ReviewWork | null>(null);

/** @throws RangeError outside a page of a review */
export function useReviewWork(): ReviewWork {
  const value = useContext(ReviewWorkContext);
  if (!value) throw new RangeError('useReviewWork: not on the page of a review');
  return value;
}

export const ReviewContext = createContext<ReviewValue | null>(null);

/** @throws RangeError outside the review page */
export function useReview(): ReviewValue {
  const value = useContext(ReviewContext);
  if (!value) throw new RangeError('useReview: not on the review page');
  return value;
}

/** What was typed, without its versions. */
function answersOf({ questions }: PublicAnswers): Answers {
  return Object.fromEntries(
    Object.entries(questions).map(([name, saved]) => [name, saved?.content]),
  ) as Answers;
}

export function useReviewWorkOf(
  first: PublicReview | null,
  about: Pick<ReviewWork, 'subject' | 'timeZone' | 'backHref'>,
): ReviewWork {
  const [review, setReview] = useState(first);
  const [work, setWork] = useState<string | null>(null);
  const { fault, submit } = useSubmission();

  async function run(name: string, call: (review: PublicReview) => Promise<PublicReview>): Promise<boolean> {
    if (!review || work !== null) return false;
    let isDone = false;
    setWork(name);
    await submit(async () => {
      setReview(await call(review));
      isDone = true;
    });
    setWork(null);
    return isDone;
  }

  return { ...about, review, work, fault, run };
}

export function useReviewOf(trial: PublicAnswers, shop: WizardShop): ReviewValue {
  const [answers] = useState(() => answersOf(trial));
  const about = {
    subject: 'plan',
    timeZone: shop.timeZone,
    backHref: `/trials/${trial.trialId}/start`,
  } as const;
  return { ...useReviewWorkOf(trial.review, about), trial, answers, shop };
}
