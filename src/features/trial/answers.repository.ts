import { z } from 'zod';
import { now } from '../../server/clock.ts';
import { jsonColumn } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';
import { type Answers, answersDocumentSchema, type QuestionName, questionNames } from './answers.schema.ts';

const questionState = z.object({
  version: z.number().int(),
  savedAt: z.number(),
  /** The person's id. */
  savedBy: z.string(),
  /** The ids of the last saves, newest first, so that one that is sent again is known. */
  saves: z.array(z.string()),
});
export type QuestionState = z.output<typeof questionState>;

const versionsSchema = z.object({
  v: z.literal(1),
  questions: z.partialRecord(z.enum(questionNames), questionState),
});

const answersRow = z.object({
  version: z.number(),
  question_versions: jsonColumn(versionsSchema),
  document: jsonColumn(answersDocumentSchema),
  frozen_hash: z.string().nullable(),
});

/** What was typed for a trial, with where each question stands. */
export interface StoredAnswers {
  /** Counts the saves of all questions. */
  version: number;
  answers: Answers;
  questions: { [Name in QuestionName]?: QuestionState | undefined };
  /** Set when the trial was started: nothing changes any more. */
  frozenHash: string | null;
}

/** @throws RangeError for a trial without answers: each has them from its first moment */
export async function readStoredAnswers(scope: ShopScope, trialId: string): Promise<StoredAnswers> {
  const row: unknown = await scope
    .db('answers')
    .where({ shop_id: scope.shopId, trial_id: trialId })
    .first('version', 'question_versions', 'document', 'frozen_hash');
  if (!row) throw new RangeError('readStoredAnswers: trialId has no answers');
  const { version, question_versions, document, frozen_hash } = answersRow.parse(row);
  return {
    version,
    answers: document.questions as Answers,
    questions: question_versions.questions,
    frozenHash: frozen_hash,
  };
}

function columnsOf(stored: Pick<StoredAnswers, 'answers' | 'questions'>) {
  return {
    document: JSON.stringify({ v: 1, questions: stored.answers }),
    question_versions: JSON.stringify({ v: 1, questions: stored.questions }),
  };
}

export async function insertAnswers(
  scope: ShopScope,
  trialId: string,
  stored: Pick<StoredAnswers, 'answers' | 'questions'> & { savedBy: string },
): Promise<void> {
  const at = now();
  await scope.db('answers').insert({
    ...columnsOf(stored),
    id: newId(),
    shop_id: scope.shopId,
    trial_id: trialId,
    version: 1,
    updated_by: stored.savedBy,
    created_at: at,
    updated_at: at,
  });
}

/** @returns false when somebody saved in between */
export async function updateAnswers(
  scope: ShopScope,
  trialId: string,
  stored: StoredAnswers & { savedBy: string },
): Promise<boolean> {
  const changed = await scope
    .db('answers')
    .where({ shop_id: scope.shopId, trial_id: trialId, version: stored.version })
    .update({
      ...columnsOf(stored),
      version: stored.version + 1,
      updated_by: stored.savedBy,
      updated_at: now(),
    });
  return changed > 0;
}

/** From here on the row is unchangeable, by a guard of the database itself. */
export async function freezeAnswers(
  scope: ShopScope,
  which: { trialId: string; version: number; hash: string },
): Promise<boolean> {
  const changed = await scope
    .db('answers')
    .where({ shop_id: scope.shopId, trial_id: which.trialId, version: which.version })
    .whereNull('frozen_hash')
    .update({ frozen_hash: which.hash });
  return changed > 0;
}
