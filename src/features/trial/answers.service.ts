import { rolesMay } from '../../server/auth/permissions.ts';
import { now } from '../../server/clock.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { readNames } from '../people/people.repository.ts';
import {
  type QuestionState,
  readStoredAnswers,
  type StoredAnswers,
  updateAnswers,
} from './answers.repository.ts';
import { type Answers, type QuestionName, questionNames } from './answers.schema.ts';
import { findLatestPlan } from './plan.repository.ts';
import { toPublicPlan } from './plan.service.ts';
import { findSecondPerson } from './readiness.service.ts';
import { findLatestReview } from './review.repository.ts';
import { hashOf, isReviewed } from './reviewed-hash.service.ts';
import type { AnswerSaved, PublicAnswers, SaveAnswer, SavedQuestions } from './saved-answers.schema.ts';
import { showReview } from './show-review.service.ts';
import { touchTrial } from './trial.repository.ts';
import { nameTrial } from './trial.ts';
import { findStep, findTrialOf, type TrialReader, takeStep } from './trial-reader.service.ts';
import { takesAnswers } from './trial-states.ts';

/** How many saves of a question are remembered, to know one that is sent again. */
const savesKept = 5;

async function showQuestions(scope: ShopScope, stored: StoredAnswers): Promise<SavedQuestions> {
  const ids = Object.values(stored.questions).flatMap((state) => (state ? [state.savedBy] : []));
  const names = await readNames(scope, [...new Set(ids)]);
  const shown = questionNames.flatMap((question) => {
    const [state, content] = [stored.questions[question], stored.answers[question]];
    if (!state || content === undefined) return [];
    const { version, savedAt, savedBy } = state;
    return [[question, { version, savedAt, savedBy: names.get(savedBy) ?? '', content }] as const];
  });
  return Object.fromEntries(shown) as SavedQuestions;
}

/** All that the wizard and the engineer's page need of a trial. @throws AppError `not-found` */
export async function readAnswers(
  scope: ShopScope,
  trialId: string,
  reader: TrialReader,
): Promise<PublicAnswers> {
  const trial = await findTrialOf(scope, trialId);
  const stored = await readStoredAnswers(scope, trialId);
  const plan = await findLatestPlan(scope, trialId);
  const review = await findLatestReview(scope, trialId, 'plan');
  const secondPerson = await findSecondPerson(scope, { answers: stored.answers, plan }, reader.personId);
  return {
    trialId,
    number: trial.number,
    title: trial.title,
    machine: trial.machine,
    state: trial.state,
    phase: trial.phase,
    revision: trial.revision,
    mayWrite: rolesMay(reader.roles, 'trial.write') && takesAnswers(trial.state),
    questions: await showQuestions(scope, stored),
    plan: plan ? toPublicPlan(plan, stored.answers) : null,
    review: review ? await showReview(scope, review, reader) : null,
    reviewDue: secondPerson === 'needed' || secondPerson === 'missing',
    secondPerson,
  };
}

/** What stands under a question, for whoever built on something older. */
async function showPresent(
  scope: ShopScope,
  stored: StoredAnswers,
  question: QuestionName,
): Promise<unknown> {
  const shown = (await showQuestions(scope, stored))[question];
  return shown ?? { version: 0, savedAt: 0, savedBy: '', content: null };
}

async function answerSave(
  scope: ShopScope,
  trialId: string,
  saved: { question: QuestionName; state: QuestionState },
): Promise<AnswerSaved> {
  const { state, revision } = await findTrialOf(scope, trialId);
  const { version, savedAt, savedBy } = saved.state;
  const name = (await readNames(scope, [savedBy])).get(savedBy) ?? '';
  return { question: saved.question, version, savedAt, savedBy: name, state, revision };
}

/** Stores what was typed, and lets an agreement lapse that was given to something else. */
async function store(
  scope: ShopScope,
  about: { trialId: string; stored: StoredAnswers; save: SaveAnswer },
  reader: TrialReader,
): Promise<QuestionState> {
  const { trialId, stored, save } = about;
  const { question, content } = save;
  const before = stored.questions[question];
  const state: QuestionState = {
    version: (before?.version ?? 0) + 1,
    savedAt: now(),
    savedBy: reader.personId,
    saves: [save.save, ...(before?.saves ?? [])].slice(0, savesKept),
  };
  const answers = { ...stored.answers, [question]: content } as Answers;
  const questions = { ...stored.questions, [question]: state };
  if (!(await updateAnswers(scope, trialId, { ...stored, answers, questions, savedBy: reader.personId }))) {
    throw new AppError('changed-meanwhile', { present: await showPresent(scope, stored, question) });
  }
  await touchTrial(scope, trialId, nameTrial(answers));
  return state;
}

/**
 * Saves one question. It succeeds when nobody saved that question since the version it builds on, when the same is there
 * already, or when this very save was stored before.
 * @throws AppError `changed-meanwhile` with what is there, `not-now` once the answers are being looked at or run on
 */
export function saveAnswer(
  scope: ShopScope,
  wish: SaveAnswer & { trialId: string },
  reader: TrialReader,
): Promise<AnswerSaved> {
  const { trialId, ...save } = wish;
  return inTransaction(scope, async (inner) => {
    const trial = await findTrialOf(inner, trialId);
    const stored = await readStoredAnswers(inner, trialId);
    const { question } = save;
    const before = stored.questions[question];
    const isThere =
      before !== undefined &&
      (before.saves.includes(save.save) || hashOf(stored.answers[question] ?? null) === hashOf(save.content));
    if (isThere) return answerSave(inner, trialId, { question, state: before });
    const step = await findStep(inner, trial, 'change an answer', reader);
    if ((before?.version ?? 0) !== save.base) {
      throw new AppError('changed-meanwhile', { present: await showPresent(inner, stored, question) });
    }
    const state = await store(inner, { trialId, stored, save }, reader);
    if (step.to !== step.from && isReviewed(question)) {
      await takeStep(inner, trial, step);
      const details = { question };
      await recordActivity(inner, { kind: 'trial.approval-lapsed', subjectId: trialId, trialId, details });
    }
    return answerSave(inner, trialId, { question, state });
  });
}
