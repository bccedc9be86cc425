import type { ShopScope } from '../../server/db/scope.ts';
import { findLatestReview } from '../trial/review.repository.ts';
import { type PublicReview, reviewSubjects } from '../trial/review.schema.ts';
import { showReview } from '../trial/show-review.service.ts';
import { findTrialOf, type TrialReader } from '../trial/trial-reader.service.ts';

export type ReviewSubject = PublicReview['subject'];

/** The latest review of each subject that was ever asked about. @throws AppError `not-found` */
export async function readSignOffs(
  scope: ShopScope,
  trialId: string,
  reader: TrialReader,
): Promise<PublicReview[]> {
  await findTrialOf(scope, trialId);
  const found: PublicReview[] = [];
  for (const subject of reviewSubjects) {
    const review = await findLatestReview(scope, trialId, subject);
    if (review) found.push(await showReview(scope, review, reader));
  }
  return found;
}

/** What to open: what the address asks for, else what waits, else what was decided last. */
export function pickSubject(reviews: readonly PublicReview[], asked: string | null): ReviewSubject | null {
  const named = reviews.find(({ subject }) => subject === asked);
  const waiting = reviews.find(({ state }) => state === 'asked');
  return (named ?? waiting ?? reviews.at(-1))?.subject ?? null;
}
