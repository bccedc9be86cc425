import { now } from '../../server/clock.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { insertAnswers, type QuestionState, readStoredAnswers } from './answers.repository.ts';
import type { Answers, QuestionName } from './answers.schema.ts';
import { carriedAnswers } from './carried-answers.ts';
import { deleteTrialRows, findTrial, insertTrial, updateTrial } from './trial.repository.ts';
import type { ChangeTrial, CreateTrial, ListTrials, PublicTrial, TrialsPage } from './trial.schema.ts';
import { nameTrial } from './trial.ts';
import {
  changedMeanwhile,
  findStep,
  findTrialOf,
  readPublicTrial,
  type TrialReader,
  toPublicTrials,
} from './trial-reader.service.ts';
import { mayPutAway, trialStates } from './trial-states.ts';
import { listTrialsPage } from './trials-list.repository.ts';

async function copyAnswers(scope: ShopScope, trialId: string): Promise<Answers> {
  await findTrialOf(scope, trialId);
  return carriedAnswers((await readStoredAnswers(scope, trialId)).answers);
}

/**
 * Adds a draft, blank or with the answers of an earlier trial. The same id again adds nothing and answers what is there.
 * @throws AppError `not-found` for an id, or an earlier trial, that is another shop's
 */
export function createTrial(
  scope: ShopScope,
  wish: CreateTrial & { id: string },
  reader: TrialReader,
): Promise<PublicTrial> {
  return inTransaction(scope, async (inner) => {
    if (await findTrial(inner, wish.id)) return readPublicTrial(inner, wish.id);
    const answers = wish.copyOf === undefined ? {} : await copyAnswers(inner, wish.copyOf);
    await addDraft(inner, { id: wish.id, answers, copyOf: wish.copyOf ?? null }, reader);
    return readPublicTrial(inner, wish.id);
  });
}

/** Adds a draft with its first answers, in the transaction of whoever asks. @throws AppError `not-found` for an id of another shop */
export async function addDraft(
  scope: ShopScope,
  draft: { id: string; answers: Answers; copyOf: string | null },
  reader: TrialReader,
): Promise<void> {
  const { id, answers, copyOf } = draft;
  // The line in the log comes first: it locks the shop, so that a number is given once.
  await recordActivity(scope, { kind: 'trial.added', subjectId: id, trialId: id, details: { copyOf } });
  const trial = { id, ownerId: reader.personId, ...nameTrial(answers) };
  if (!(await insertTrial(scope, trial))) throw new AppError('not-found', { detail: 'id of another shop' });
  const state: QuestionState = { version: 1, savedAt: now(), savedBy: reader.personId, saves: [] };
  const questions = Object.fromEntries(
    (Object.keys(answers) as QuestionName[]).map((question) => [question, state]),
  );
  await insertAnswers(scope, id, { answers, questions, savedBy: reader.personId });
}

export async function listTrials(scope: ShopScope, list: ListTrials): Promise<TrialsPage> {
  const { trials, next } = await listTrialsPage(scope, list);
  return { trials: await toPublicTrials(scope, trials), next };
}

/**
 * Puts a trial away, or takes it out again. A trial that is put away already stays so.
 * @throws AppError `not-now` while it is being run, `changed-meanwhile` with the present state
 */
export function putAwayTrial(scope: ShopScope, which: ChangeTrial & { id: string }): Promise<PublicTrial> {
  return inTransaction(scope, async (inner) => {
    const trial = await findTrialOf(inner, which.id);
    if ((trial.putAwayAt !== null) === which.putAway) return readPublicTrial(inner, which.id);
    if (!mayPutAway(trial.state)) throw new AppError('not-now', { detail: `put away in ${trial.state}` });
    const state = { id: which.id, from: trialStates.filter(mayPutAway), revision: which.revision };
    if (!(await updateTrial(inner, state, { putAwayAt: which.putAway ? now() : null }))) {
      throw await changedMeanwhile(inner, which.id);
    }
    const kind = which.putAway ? 'trial.put-away' : 'trial.taken-out';
    await recordActivity(inner, { kind, subjectId: which.id, trialId: which.id });
    return readPublicTrial(inner, which.id);
  });
}

/** Deletes a draft for good. @throws AppError `not-now` for any other state, `changed-meanwhile` with the present state */
export function deleteTrial(
  scope: ShopScope,
  which: { id: string; revision: number },
  reader: TrialReader,
): Promise<undefined> {
  return inTransaction(scope, async (inner) => {
    const trial = await findTrialOf(inner, which.id);
    const { from } = await findStep(inner, trial, 'delete', reader);
    if (!(await deleteTrialRows(inner, { ...which, from: [from] }))) {
      throw await changedMeanwhile(inner, which.id);
    }
    const details = { number: trial.number };
    await recordActivity(inner, { kind: 'trial.deleted', subjectId: which.id, trialId: which.id, details });
    return undefined;
  });
}
