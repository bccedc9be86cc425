import { NoConnection, ServerRefusal } from '../../../components/island/call-server.ts';
import { presentAnswerSchema, type SaveAnswerBody } from '../saved-answers.schema.ts';
import { readAnswersCall, saveAnswerCall } from '../trial.queries.ts';
import type { SaveOutcome, SaveRequest, StoredAnswers } from './stored-answers.ts';

/** Refusals that pass by themselves: the same save is tried again. */
const passing: readonly string[] = ['busy', 'unexpected', 'too-many'];

function outcomeOf(thrown: unknown): SaveOutcome {
  if (thrown instanceof NoConnection) return { kind: 'offline' };
  if (!(thrown instanceof ServerRefusal)) throw thrown;
  const { problem } = thrown;
  const present = presentAnswerSchema.safeParse(problem.present);
  if (problem.code === 'changed-meanwhile' && present.success) {
    return { kind: 'changed meanwhile', present: present.data };
  }
  if (problem.code === 'not-signed-in') return { kind: 'signed out' };
  return passing.includes(problem.code) ? { kind: 'offline' } : { kind: 'refused', sentence: problem.detail };
}

/** Saves one question; whatever the server says to it is an outcome, not an error. */
export async function saveAnswer(
  trialId: string,
  request: SaveRequest,
  options: { keepalive?: boolean } = {},
): Promise<SaveOutcome> {
  try {
    const { version, savedAt } = await saveAnswerCall(trialId, request as SaveAnswerBody, options);
    return { kind: 'saved', version, savedAt };
  } catch (thrown) {
    return outcomeOf(thrown);
  }
}

/** What the server has now; null when it cannot be asked. */
export async function loadAnswers(trialId: string): Promise<StoredAnswers | null> {
  try {
    return (await readAnswersCall(trialId)).questions;
  } catch (thrown) {
    outcomeOf(thrown);
    return null;
  }
}
