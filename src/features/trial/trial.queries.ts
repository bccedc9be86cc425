import { queryOptions } from '@tanstack/react-query';
import { z } from 'zod';
import { callServer } from '../../components/island/call-server.ts';
import { type ImportedTrial, importedTrialSchema } from '../audit/pack/imported-trial.schema.ts';
import {
  type AddComment,
  type PublicReview,
  publicReviewSchema,
  type SettleComment,
} from './review.schema.ts';
import {
  type AnswerSaved,
  answerSavedSchema,
  type PublicAnswers,
  publicAnswersSchema,
  type SaveAnswerBody,
} from './saved-answers.schema.ts';
import {
  type ChangeTrial,
  type ChoosePlan,
  type CreateTrial,
  type PublicTrial,
  publicTrialSchema,
  type TrialEventBody,
  type TrialsPage,
  trialsPageSchema,
} from './trial.schema.ts';

const nothing = z.undefined();

function pathOf(trialId: string, part = ''): string {
  return `/api/trials/${trialId}${part}`;
}

/** A trial with what was typed so far; the page brings the first answer along. */
export function answersOptions(first: PublicAnswers) {
  return queryOptions({
    queryKey: ['trial answers', first.trialId],
    queryFn: () => readAnswersCall(first.trialId),
    initialData: first,
    staleTime: Number.POSITIVE_INFINITY,
  });
}

/** @param trialId the client's own, so that asking twice makes one trial */
export function createTrialCall(trialId: string, body: CreateTrial = {}): Promise<PublicTrial> {
  return callServer(pathOf(trialId), { method: 'PUT', body, output: publicTrialSchema });
}

export function deleteTrialCall(trial: Pick<PublicTrial, 'id' | 'revision'>): Promise<undefined> {
  const path = pathOf(trial.id, `?revision=${trial.revision}`);
  return callServer(path, { method: 'DELETE', output: nothing });
}

/** Puts a trial away, or takes it out again. */
export function changeTrialCall(trialId: string, body: ChangeTrial): Promise<PublicTrial> {
  return callServer(pathOf(trialId), { method: 'PATCH', body, output: publicTrialSchema });
}

/** Brings a trial in from a file that any shop took out. */
export function importTrialCall(file: Blob): Promise<ImportedTrial> {
  const body = new Blob([file], { type: 'application/json' });
  return callServer('/api/trials/import', { method: 'POST', body, output: importedTrialSchema });
}

/** @param query as the address of the list has it: search, state, show, sort, direction, after, limit */
export function listTrialsCall(query: URLSearchParams): Promise<TrialsPage> {
  return callServer(`/api/trials?${query}`, { output: trialsPageSchema });
}

export function readAnswersCall(trialId: string): Promise<PublicAnswers> {
  return callServer(pathOf(trialId, '/answers'), { output: publicAnswersSchema });
}

/**
 * Saves one question.
 * @param options.keepalive for the save while the page is being left
 * @throws ServerRefusal `changed-meanwhile` with `present` as `presentAnswerSchema` says
 */
export function saveAnswerCall(
  trialId: string,
  body: SaveAnswerBody,
  { keepalive = false }: { keepalive?: boolean } = {},
): Promise<AnswerSaved> {
  const path = pathOf(trialId, '/answers');
  return callServer(path, { method: 'PATCH', body, output: answerSavedSchema, keepalive });
}

/** Chooses one of the proposals by its id; the answer has the plan with its runs in order. */
export function choosePlanCall(trialId: string, body: ChoosePlan): Promise<PublicAnswers> {
  return callServer(pathOf(trialId, '/plan'), { method: 'POST', body, output: publicAnswersSchema });
}

/** Sends the plan for review, or starts the trial. */
export function trialEventCall(trialId: string, body: TrialEventBody): Promise<PublicAnswers> {
  return callServer(pathOf(trialId, '/events'), { method: 'POST', body, output: publicAnswersSchema });
}

export function decideReviewCall(
  review: Pick<PublicReview, 'id' | 'round'>,
  action: 'approve' | 'send-back' | 'take-back',
): Promise<PublicReview> {
  const body = { round: review.round };
  return callServer(`/api/reviews/${review.id}/${action}`, {
    method: 'POST',
    body,
    output: publicReviewSchema,
  });
}

export function addCommentCall(reviewId: string, body: AddComment): Promise<PublicReview> {
  return callServer(`/api/reviews/${reviewId}/comments`, {
    method: 'POST',
    body,
    output: publicReviewSchema,
  });
}

export function settleCommentCall(reviewId: string, body: SettleComment): Promise<PublicReview> {
  return callServer(`/api/reviews/${reviewId}/comments`, {
    method: 'PATCH',
    body,
    output: publicReviewSchema,
  });
}
