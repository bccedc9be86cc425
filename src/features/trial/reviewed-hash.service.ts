import { createHash } from 'node:crypto';
import { type ActivityDetail, canonicalJson } from '../../server/db/activity-log.ts';
import type { Answers, QuestionName } from './answers.schema.ts';

/** The hash of a value as JSON: equal content has an equal hash, in whatever order its fields came. */
export function hashOf(value: unknown): string {
  const plain: ActivityDetail = JSON.parse(JSON.stringify(value));
  return createHash('sha256').update(canonicalJson(plain)).digest('hex');
}

/** What says when a trial runs, and not what is run: no reason to look at it again. */
const notReviewed: readonly QuestionName[] = ['pace', 'ready'];

export function isReviewed(question: QuestionName): boolean {
  return !notReviewed.includes(question);
}

/** The hash of what a reviewer agrees to: the answers and the plan that was chosen. */
export function hashOfReviewed(answers: Answers, plan: { hash: string } | null): string {
  const reviewed = Object.entries(answers).filter(([question]) => isReviewed(question as QuestionName));
  return hashOf({ answers: Object.fromEntries(reviewed), plan: plan?.hash ?? null });
}
