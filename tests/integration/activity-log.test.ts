import { describe, expect, it } from 'vitest';
import { checkActivityChain, listActivity, recordActivity } from '../../src/server/db/activity-log.ts';
import { inTransaction } from '../../src/server/db/in-transaction.ts';
import { allowChanges, refuseChanges } from '../../src/server/db/schema-parts.ts';
import type { ShopScope } from '../../src/server/db/scope.ts';
import { buildShop } from '../builders/shop.ts';

async function recordMany(scope: ShopScope, count: number): Promise<void> {
  for (let line = 1; line <= count; line += 1) {
    await inTransaction(scope, (inside) =>
      recordActivity(inside, {
        kind: 'test.happened',
        details: { line, z: 1, a: [null, true, { b: 2, a: 1 }] },
      }),
    );
  }
}

async function tamper(scope: ShopScope, change: () => Promise<unknown>): Promise<void> {
  await allowChanges(scope.db, 'activity');
  await change();
  await refuseChanges(scope.db, 'activity');
}

describe('the activity log', () => {
  it('numbers and chains its lines for each shop on its own', async () => {
    const [one, other] = [await buildShop(), await buildShop()];
    await recordMany(one, 3);
    await recordMany(other, 1);
    expect(await checkActivityChain(one)).toEqual({ intact: true, lines: 3 });
    expect(await checkActivityChain(other)).toEqual({ intact: true, lines: 1 });
    expect((await listActivity(one, { limit: 2 })).map((row) => row.seq)).toEqual([3, 2]);
    expect((await listActivity(one, { limit: 2, before: 2 })).map((row) => row.seq)).toEqual([1]);
  });

  it('is undone together with the change it tells of', async () => {
    const scope = await buildShop();
    const failing = inTransaction(scope, async (inside) => {
      await recordActivity(inside, { kind: 'test.happened' });
      throw new Error('the change failed');
    });
    await expect(failing).rejects.toThrow('the change failed');
    expect(await checkActivityChain(scope)).toEqual({ intact: true, lines: 0 });
  });

  it('refuses to be written outside of a transaction', async () => {
    const scope = await buildShop();
    await expect(recordActivity(scope, { kind: 'test.happened' })).rejects.toThrow(RangeError);
  });

  it('refuses changes and deletions', async () => {
    const scope = await buildShop();
    await recordMany(scope, 1);
    const rows = () => scope.db('activity').where({ shop_id: scope.shopId });
    await expect(rows().update({ kind: 'test.forged' })).rejects.toThrow('activity only grows');
    await expect(rows().delete()).rejects.toThrow('activity only grows');
  });

  it.each([
    [
      'an altered line',
      { seq: 2, reason: 'altered' },
      (rows: RowsAt) => rows(2).update({ details: '{"v":1}' }),
    ],
    ['a line taken out', { seq: 2, reason: 'missing' }, (rows: RowsAt) => rows(2).delete()],
    ['the last line taken away', { seq: 3, reason: 'head' }, (rows: RowsAt) => rows(3).delete()],
  ])('finds %s beneath it', async (_what, finding, change) => {
    const scope = await buildShop();
    await recordMany(scope, 3);
    await tamper(scope, async () =>
      change((seq) => scope.db('activity').where({ shop_id: scope.shopId, seq })),
    );
    expect(await checkActivityChain(scope)).toEqual({ intact: false, ...finding });
  });
});

type RowsAt = (seq: number) => ReturnType<ShopScope['db']>;
