import { z } from 'zod';
import { now } from '../../server/clock.ts';
import { moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';
import { stretchKinds } from './stretch.ts';

const stretchRow = z.object({
  id: z.string(),
  n: z.number(),
  kind: z.enum(stretchKinds),
  words: z.string(),
  at: moment,
});
export type Stretch = z.output<typeof stretchRow>;

/** In their order; the last one is under way. */
export async function listStretches(scope: ShopScope, trialId: string): Promise<Stretch[]> {
  const own = { shop_id: scope.shopId, trial_id: trialId };
  return z.array(stretchRow).parse(await scope.db('stretches').where(own).orderBy('n'));
}

/** @returns the id of the stretch that is under way */
export async function findStretch(scope: ShopScope, trialId: string): Promise<string | null> {
  const own = { shop_id: scope.shopId, trial_id: trialId };
  const row = await scope.db('stretches').where(own).orderBy('n', 'desc').first('id');
  return row ? String(row['id']) : null;
}

/** Adds the next stretch of a trial. @returns its number */
export async function insertStretch(
  scope: ShopScope,
  stretch: { trialId: string; kind: Stretch['kind']; words: string },
): Promise<number> {
  const { trialId, kind, words } = stretch;
  const n = ((await listStretches(scope, trialId)).at(-1)?.n ?? 0) + 1;
  const row = { id: newId(), shop_id: scope.shopId, trial_id: trialId, n, kind, words, at: now() };
  await scope.db('stretches').insert(row);
  return n;
}
