import { z } from 'zod';
import { now } from '../../server/clock.ts';
import { foldForSearch, moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import type { Trial } from './trial.ts';
import { type TrialState, trialStates } from './trial-states.ts';

const trialRow = z.object({
  id: z.string(),
  number: z.number(),
  title: z.string(),
  machine: z.string(),
  owner_id: z.string(),
  phase: z.enum(['main', 'check']),
  state: z.enum(trialStates),
  revision: z.number(),
  put_away_at: moment.nullable(),
  created_at: moment,
  updated_at: moment,
});

export function readTrialRows(rows: unknown): Trial[] {
  return z
    .array(trialRow)
    .parse(rows)
    .map((row) => ({
      id: row.id,
      number: row.number,
      title: row.title,
      machine: row.machine,
      ownerId: row.owner_id,
      phase: row.phase,
      state: row.state,
      revision: row.revision,
      putAwayAt: row.put_away_at,
      createdAt: row.created_at,
      updatedAt: row.updated_at,
    }));
}

export async function findTrial(scope: ShopScope, id: string): Promise<Trial | null> {
  const [trial] = readTrialRows(await scope.db('trials').where({ shop_id: scope.shopId, id }));
  return trial ?? null;
}

function namedColumns(name: { title: string; machine: string }) {
  return {
    title: name.title,
    title_search: foldForSearch(name.title),
    machine: name.machine,
    machine_search: foldForSearch(name.machine),
  };
}

/**
 * Adds a draft under the shop's next number. The caller holds the lock on the shop's row, so that a number is given once.
 * @returns false when the id is taken, by this shop or by another
 */
export async function insertTrial(
  scope: ShopScope,
  trial: { id: string; ownerId: string; title: string; machine: string },
): Promise<boolean> {
  const { db, shopId } = scope;
  const last = await db('trials').where({ shop_id: shopId }).max({ number: 'number' }).first();
  const at = now();
  const added = await db('trials')
    .insert({
      ...namedColumns(trial),
      id: trial.id,
      shop_id: shopId,
      number: Number(last?.['number'] ?? 0) + 1,
      owner_id: trial.ownerId,
      created_at: at,
      updated_at: at,
    })
    .onConflict('id')
    .ignore()
    .returning('id');
  return added.length > 0;
}

export interface TrialCondition {
  id: string;
  /** The states it may be in. */
  from: readonly TrialState[];
  /** The revision that was seen; left out where any will do. */
  revision?: number;
}

/** Changes a trial that is still as it was seen, and counts its revision up. @returns whether it was changed */
export async function updateTrial(
  scope: ShopScope,
  which: TrialCondition,
  change: { state?: TrialState; putAwayAt?: number | null },
): Promise<boolean> {
  const query = scope
    .db('trials')
    .where({ shop_id: scope.shopId, id: which.id })
    .whereIn('state', [...which.from]);
  if (which.revision !== undefined) query.where({ revision: which.revision });
  const changed = await query.update({
    ...(change.state === undefined ? {} : { state: change.state }),
    ...(change.putAwayAt === undefined ? {} : { put_away_at: change.putAwayAt }),
    revision: scope.db.raw('revision + 1'),
    board_revision: scope.db.raw('board_revision + 1'),
    updated_at: now(),
  });
  return changed > 0;
}

/** Follows what was typed: the name, and when it was last worked on. */
export async function touchTrial(
  scope: ShopScope,
  id: string,
  name: { title: string; machine: string },
): Promise<void> {
  await scope
    .db('trials')
    .where({ shop_id: scope.shopId, id })
    .update({ ...namedColumns(name), updated_at: now() });
}

/** Takes a draft away with all that hangs on it. @returns whether it was there as it was seen */
export async function deleteTrialRows(scope: ShopScope, which: TrialCondition): Promise<boolean> {
  const { db, shopId } = scope;
  const found = await updateTrial(scope, which, {});
  if (!found) return false;
  const own = { shop_id: shopId, trial_id: which.id };
  await db('messages').where(own).where({ state: 'waiting' }).update({ state: 'cancelled' });
  await db('messages').where(own).update({ trial_id: null });
  const reviews = db('reviews').where(own).select('id');
  await db('review_comments').where({ shop_id: shopId }).whereIn('review_id', reviews).delete();
  for (const table of ['reviews', 'plans', 'answers']) await db(table).where(own).delete();
  await db('trials')
    .where({ shop_id: shopId, follows_trial_id: which.id })
    .update({ follows_trial_id: null });
  await db('trials').where({ shop_id: shopId, id: which.id }).delete();
  return true;
}
