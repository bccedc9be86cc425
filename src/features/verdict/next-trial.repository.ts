import { z } from 'zod';
import type { ShopScope } from '../../server/db/scope.ts';
import { trialStates } from '../trial/trial-states.ts';
import { type FollowReason, followReasons } from './follow-reason.ts';

const neighbour = z.object({
  id: z.string(),
  number: z.number(),
  title: z.string(),
  state: z.enum(trialStates),
});
/** A trial before or behind, as a link to it reads. */
export type NeighbourTrial = z.output<typeof neighbour>;

const followRow = z.object({
  follows_trial_id: z.string().nullable(),
  follow_reason: z.enum(followReasons).nullable(),
});

/** Keeps what a trial follows, and why. */
export async function keepFollow(
  scope: ShopScope,
  trial: { id: string; follows: string; reason: FollowReason },
): Promise<void> {
  await scope
    .db('trials')
    .where({ shop_id: scope.shopId, id: trial.id })
    .update({ follows_trial_id: trial.follows, follow_reason: trial.reason });
}

/** The trial before this one, with the reason; null where it follows none. */
export async function findFollowed(
  scope: ShopScope,
  trialId: string,
): Promise<{ trial: NeighbourTrial; reason: FollowReason } | null> {
  const own: unknown = await scope.db('trials').where({ shop_id: scope.shopId, id: trialId }).first();
  const { follows_trial_id, follow_reason } = followRow.parse(own);
  if (follows_trial_id === null || follow_reason === null) return null;
  const before: unknown = await scope
    .db('trials')
    .where({ shop_id: scope.shopId, id: follows_trial_id })
    .first('id', 'number', 'title', 'state');
  return before ? { trial: neighbour.parse(before), reason: follow_reason } : null;
}

/** The trials that follow this one, oldest first. */
export async function listFollowing(scope: ShopScope, trialId: string): Promise<NeighbourTrial[]> {
  const rows: unknown = await scope
    .db('trials')
    .where({ shop_id: scope.shopId, follows_trial_id: trialId })
    .orderBy('number')
    .select('id', 'number', 'title', 'state');
  return z.array(neighbour).parse(rows);
}
