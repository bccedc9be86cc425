import type { ShopScope } from '../../server/db/scope.ts';

/** The analysis behind a verdict, word for word as it was stored when the verdict was made. */
export async function findStoredAnalysis(
  scope: ShopScope,
  trialId: string,
  n: number,
): Promise<string | null> {
  const row = await scope
    .db('verdicts')
    .where({ shop_id: scope.shopId, trial_id: trialId, n })
    .first('analysis');
  return row ? String(row['analysis']) : null;
}
