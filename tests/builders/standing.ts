import type { Answers } from '../../src/features/trial/answers.schema.ts';
import type { PublicPlan } from '../../src/features/trial/plan.schema.ts';
import type { PublicReview } from '../../src/features/trial/review.schema.ts';
import type { PublicAnswers, SavedQuestions } from '../../src/features/trial/saved-answers.schema.ts';
import { toBrief } from '../../src/features/trial/to-brief.ts';
import { hardestRuns, layOutRuns, proposePlans } from '../../src/lib/doe/index.ts';

const savedAt = Date.UTC(2026, 2, 12, 8, 10);

/** The plan that the core recommends for these answers, as the server sends it. */
export function planFor(answers: Answers): PublicPlan {
  const read = toBrief(answers);
  if ('problems' in read) throw new RangeError(`planFor: ${JSON.stringify(read.problems)}`);
  const { brief, settingOfLetter: settingIds } = read;
  const [proposal] = proposePlans(brief);
  if (!proposal) throw new RangeError('planFor: answers give no plan');
  const runs = layOutRuns(brief, proposal, 1);
  const hardest = hardestRuns(brief, runs).map(({ order }) => {
    const coded = runs.find((run) => run.order === order)?.coded ?? [];
    const ends = settingIds.map((id, place) => [id, (coded[place] ?? 0) > 0 ? 'high' : 'low'] as const);
    return { order, ends: Object.fromEntries(ends) };
  });
  return {
    n: 1,
    proposalId: proposal.id,
    proposal,
    settingIds,
    runs: runs.map(({ actual, ...run }) => ({ ...run, planned: actual })),
    hardest,
    hash: 'hash',
    fits: true,
  };
}

/** A draft as the server tells it, with these answers saved once. */
export function standingFor(answers: Answers, more: Partial<PublicAnswers> = {}): PublicAnswers {
  const questions = Object.fromEntries(
    Object.entries(answers).map(([name, content]) => [
      name,
      { version: 1, savedAt, savedBy: 'Dana', content },
    ]),
  ) as SavedQuestions;
  return {
    trialId: 'trial',
    number: 1,
    title: 'Line 3 seals',
    machine: 'Line 3',
    state: 'draft',
    phase: 'main',
    revision: 1,
    mayWrite: true,
    questions,
    plan: planFor(answers),
    review: null,
    reviewDue: false,
    secondPerson: 'not needed',
    ...more,
  };
}

export function reviewFor(more: Partial<PublicReview> = {}): PublicReview {
  return {
    id: 'review',
    subject: 'plan',
    round: 1,
    state: 'asked',
    askedBy: 'Dana',
    askedAt: savedAt,
    decidedBy: null,
    decidedAt: null,
    holds: false,
    mayDecide: false,
    comments: [],
    ...more,
  };
}
