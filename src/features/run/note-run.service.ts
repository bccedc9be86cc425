import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { insertNote } from './note.repository.ts';
import { touchBoard } from './run.repository.ts';
import { findRunOf, requireRunStep } from './run-reader.service.ts';

/**
 * Adds a remark to a run, whatever its state.
 * @param note.submission the note's id, so that sending it twice makes one
 * @throws AppError `not-found`
 */
export function noteRun(
  scope: ShopScope,
  note: { runId: string; submission: string; words: string; by: string | null },
): Promise<void> {
  return inTransaction(scope, async (inner) => {
    const run = await findRunOf(inner, note.runId);
    requireRunStep(run, 'note');
    const { submission: id, words, by: writtenBy } = note;
    if (!(await insertNote(inner, { id, trialId: run.trialId, runId: run.id, words, writtenBy }))) return;
    await touchBoard(inner, run.trialId);
    await recordActivity(inner, {
      kind: 'run.noted',
      subjectId: run.id,
      trialId: run.trialId,
      details: { run: run.number },
    });
  });
}
