import type { ShopScope } from '../../server/db/scope.ts';
import type { Run } from './run.ts';

async function lastOf(scope: ShopScope, trialId: string): Promise<{ number: number; place: number }> {
  const last = await scope
    .db('runs')
    .where({ shop_id: scope.shopId, trial_id: trialId })
    .max({ number: 'number', place: 'place' })
    .first();
  return { number: Number(last?.['number'] ?? 0), place: Number(last?.['place'] ?? 0) };
}

/** Lets a run that waits take its turn after all others. */
export async function moveToEnd(scope: ShopScope, run: Run): Promise<void> {
  const { place } = await lastOf(scope, run.trialId);
  await scope
    .db('runs')
    .where({ shop_id: scope.shopId, id: run.id })
    .update({ place: place + 1 });
}

/** What a run that is added takes over from one that is there. */
export type AddedRun = Pick<
  Run,
  'trialId' | 'planId' | 'block' | 'wholePlot' | 'group' | 'center' | 'coded' | 'planned'
> & {
  id: string;
  warmUp: boolean;
  repeatsRunId: string | null;
  personId: string | null;
  measurerId: string | null;
  /** Its turn; null: after all others. Those from there on move up. */
  place: number | null;
};

/** Adds a waiting run with the next number of its trial. @returns false when the id is taken */
export async function insertAddedRun(scope: ShopScope, run: AddedRun): Promise<boolean> {
  const { db, shopId } = scope;
  const last = await lastOf(scope, run.trialId);
  const taken: unknown = await db('runs').where({ id: run.id }).first('id');
  if (taken !== undefined) return false;
  if (run.place !== null) {
    await db('runs')
      .where({ shop_id: shopId, trial_id: run.trialId })
      .where('place', '>=', run.place)
      .update({ place: db.raw('place + 1') });
  }
  await db('runs').insert({
    id: run.id,
    shop_id: shopId,
    trial_id: run.trialId,
    plan_id: run.planId,
    number: last.number + 1,
    place: run.place ?? last.place + 1,
    block: run.block,
    whole_plot: run.wholePlot,
    group_key: run.group,
    center: run.center,
    warm_up: run.warmUp,
    coded: JSON.stringify({ v: 1, x: run.coded }),
    planned: JSON.stringify({ v: 1, values: run.planned }),
    state: 'waiting',
    person_id: run.personId,
    measurer_id: run.measurerId,
    repeats_run_id: run.repeatsRunId,
  });
  return true;
}
