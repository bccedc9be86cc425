import { z } from 'zod';
import type { ShopScope } from '../../server/db/scope.ts';

const countRow = z.object({ texts: z.coerce.number(), parts: z.coerce.number().nullable() });

/**
 * Texts that the service took, and the parts it bills for them: of a trial, or of the whole shop.
 * @param which.since milliseconds UTC; all there are without it
 */
export async function countTextsSent(
  scope: ShopScope,
  which: { trialId?: string; since?: number },
): Promise<{ texts: number; parts: number }> {
  const { trialId, since = 0 } = which;
  const query = scope
    .db('messages')
    .where({ shop_id: scope.shopId, channel: 'text' })
    .whereNotNull('provider_id')
    .where('created_at', '>=', since);
  if (trialId !== undefined) query.where({ trial_id: trialId });
  const row = await query.count({ texts: '*' }).sum({ parts: 'segments' }).first();
  const { texts, parts } = countRow.parse(row);
  return { texts, parts: parts ?? 0 };
}
