import { z } from 'zod';
import { moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';

const spanRow = z.object({ first_at: moment.nullable(), last_at: moment.nullable() });

/** When the main runs began and ended, and how many were left out. Moments in milliseconds UTC. */
export async function readTrialSpan(
  scope: ShopScope,
  trialId: string,
): Promise<{ firstAt: number | null; lastAt: number | null; skipped: number }> {
  const { db, shopId } = scope;
  const plans = db('plans').where({ shop_id: shopId, trial_id: trialId, phase: 'main' }).select('id');
  const runs = () => db('runs').where({ shop_id: shopId, trial_id: trialId }).whereIn('plan_id', plans);
  const span = spanRow.parse(
    await runs().min({ first_at: 'asked_at' }).max({ last_at: 'measured_at' }).first(),
  );
  const skipped = await runs().where({ state: 'skipped' }).count({ count: '*' }).first();
  return { firstAt: span.first_at, lastAt: span.last_at, skipped: Number(skipped?.['count'] ?? 0) };
}
