import { z } from 'zod';
import { now } from '../../server/clock.ts';
import { moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { type ProblemKind, problemKinds } from './problem-kinds.ts';

const problemRow = z.object({
  id: z.string(),
  kind: z.enum(problemKinds),
  run_id: z.string().nullable(),
  words: z.string(),
  raised_by: z.string().nullable(),
  raised_at: moment,
});
export type StoredProblem = z.output<typeof problemRow>;

/** @returns false when the id is taken: the same problem sent again */
export async function insertProblem(
  scope: ShopScope,
  problem: {
    id: string;
    trialId: string;
    runId: string | null;
    words: string;
    raisedBy: string | null;
    kind?: ProblemKind;
  },
): Promise<boolean> {
  const added = await scope
    .db('problems')
    .insert({
      id: problem.id,
      shop_id: scope.shopId,
      trial_id: problem.trialId,
      run_id: problem.runId,
      words: problem.words,
      kind: problem.kind ?? 'problem',
      raised_by: problem.raisedBy,
      raised_at: now(),
    })
    .onConflict('id')
    .ignore()
    .returning('id');
  return added.length > 0;
}

/** Those that nobody has dealt with yet, oldest first. While there is one of `blockingKinds`, no prompt goes out. */
export async function listOpenProblems(scope: ShopScope, trialId: string): Promise<StoredProblem[]> {
  const open = { shop_id: scope.shopId, trial_id: trialId, settled_at: null };
  return z.array(problemRow).parse(await scope.db('problems').where(open).orderBy('id'));
}

/** Settles open problems of a trial: the one that is named, or all. @returns how many there were */
export async function settleProblems(
  scope: ShopScope,
  which: { trialId: string; id?: string },
  settledBy: string,
): Promise<number> {
  const query = scope
    .db('problems')
    .where({ shop_id: scope.shopId, trial_id: which.trialId })
    .whereNull('settled_at');
  if (which.id !== undefined) query.where({ id: which.id });
  return query.update({ settled_by: settledBy, settled_at: now() });
}

/** A run that is closed answers that a setting of it could not be reached. */
export async function settleProblemsOfRun(scope: ShopScope, runId: string): Promise<void> {
  await scope
    .db('problems')
    .where({ shop_id: scope.shopId, run_id: runId, kind: 'cannot' })
    .whereNull('settled_at')
    .update({ settled_at: now() });
}
