import { z } from 'zod';
import { now } from '../../server/clock.ts';
import { moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';

const setBackRow = z.object({ set_back_asked_at: moment.nullable(), set_back_at: moment.nullable() });

/** Whether the usual settings are back on the machine; `not due` before anybody had to see to it. */
export async function readSetBack(scope: ShopScope, trialId: string): Promise<'not due' | 'asked' | 'done'> {
  const row: unknown = await scope
    .db('trials')
    .where({ shop_id: scope.shopId, id: trialId })
    .first('set_back_asked_at', 'set_back_at');
  const { set_back_asked_at, set_back_at } = setBackRow.parse(row);
  if (set_back_asked_at === null) return 'not due';
  return set_back_at === null ? 'asked' : 'done';
}

/** That somebody was asked to put the usual settings back, or did it; `not due`: the trial goes on. */
export async function noteSetBack(
  scope: ShopScope,
  trialId: string,
  what: 'asked' | 'done' | 'not due',
): Promise<void> {
  const at = now();
  const set = {
    asked: { set_back_asked_at: at, set_back_at: null },
    done: { set_back_at: at },
    'not due': { set_back_asked_at: null, set_back_at: null },
  }[what];
  await scope.db('trials').where({ shop_id: scope.shopId, id: trialId }).update(set);
}

/** Trials in which somebody may still be at the machine, newest first. */
export async function listTrialsAtMachine(scope: ShopScope): Promise<string[]> {
  const ids: unknown[] = await scope
    .db('trials')
    .where({ shop_id: scope.shopId })
    .andWhere((at) =>
      at
        .whereIn('state', ['running', 'paused', 'held'])
        .orWhere((back) => back.whereNotNull('set_back_asked_at').whereNull('set_back_at')),
    )
    .orderBy('number', 'desc')
    .pluck('id');
  return ids.map(String);
}
