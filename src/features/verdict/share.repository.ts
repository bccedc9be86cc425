import { z } from 'zod';
import { now } from '../../server/clock.ts';
import { moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import type { PublicShare } from './share.schema.ts';

const shareRow = z.object({ id: z.string(), created_at: moment, expires_at: moment });

function liveShares({ db, shopId }: ShopScope, trialId: string) {
  return db('links')
    .where({ shop_id: shopId, trial_id: trialId, purpose: 'share' })
    .whereNull('revoked_at')
    .where('expires_at', '>', now());
}

/** The links to a trial's verdict that still open, newest first. */
export async function listShares(scope: ShopScope, trialId: string): Promise<PublicShare[]> {
  const rows: unknown = await liveShares(scope, trialId).orderBy('created_at', 'desc');
  return z
    .array(shareRow)
    .parse(rows)
    .map(({ id, created_at, expires_at }) => ({ id, madeAt: created_at, endsAt: expires_at }));
}

/** @returns whether there was such a link that still opened */
export async function revokeShare(
  scope: ShopScope,
  which: { trialId: string; id: string },
): Promise<boolean> {
  const ended = await liveShares(scope, which.trialId).where({ id: which.id }).update({ revoked_at: now() });
  return ended > 0;
}
