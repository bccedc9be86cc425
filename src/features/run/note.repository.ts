import { z } from 'zod';
import { now } from '../../server/clock.ts';
import { moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';

const noteRow = z.object({
  id: z.string(),
  run_id: z.string().nullable(),
  words: z.string(),
  written_by: z.string().nullable(),
  created_at: moment,
});
export type StoredNote = z.output<typeof noteRow>;

/** @returns false when the id is taken: the same note sent again */
export async function insertNote(
  scope: ShopScope,
  note: { id: string; trialId: string; runId: string | null; words: string; writtenBy: string | null },
): Promise<boolean> {
  const added = await scope
    .db('notes')
    .insert({
      id: note.id,
      shop_id: scope.shopId,
      trial_id: note.trialId,
      run_id: note.runId,
      words: note.words,
      written_by: note.writtenBy,
      created_at: now(),
    })
    .onConflict('id')
    .ignore()
    .returning('id');
  return added.length > 0;
}

/** Oldest first. */
export async function listNotes(scope: ShopScope, trialId: string): Promise<StoredNote[]> {
  const own = { shop_id: scope.shopId, trial_id: trialId };
  return z.array(noteRow).parse(await scope.db('notes').where(own).orderBy('id'));
}
