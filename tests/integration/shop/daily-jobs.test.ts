import { mkdirSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeEach, describe, expect, it } from 'vitest';
import { recordActivity } from '../../../src/server/db/activity-log.ts';
import { readAppState } from '../../../src/server/db/app-state.ts';
import { backUpDaily } from '../../../src/server/db/backups.ts';
import { database, openDatabase } from '../../../src/server/db/connection.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import { allowChanges, refuseChanges } from '../../../src/server/db/schema-parts.ts';
import { config } from '../../../src/server/env.ts';
import { checkLog } from '../../../src/worker/check-log.ts';
import { daily } from '../../../src/worker/daily.ts';
import { buildShop } from '../../builders/shop.ts';

const folder = () => join(config().dataDir, 'backups');
const context = (workerId: string) => ({ db: database(), workerId, stopping: () => false });

beforeEach(() => rmSync(folder(), { recursive: true, force: true }));

describe('the daily backup', () => {
  it('is a whole copy that opens by itself', async () => {
    const scope = await buildShop({ name: 'Copied shop' });
    const file = await backUpDaily(database(), config(), '2026-12-01');
    const copy = openDatabase({ kind: 'sqlite', file: file ?? '' });
    const row = await copy('shops').where({ id: scope.shopId }).first('name');
    await copy.destroy();
    expect(row).toEqual({ name: 'Copied shop' });
  });

  it('keeps the last seven, and what others put there', async () => {
    mkdirSync(folder(), { recursive: true });
    writeFileSync(join(folder(), 'before-the-move.sqlite'), 'mine');
    for (let day = 1; day <= 9; day += 1) await backUpDaily(database(), config(), `2026-12-0${day}`);
    const days = [3, 4, 5, 6, 7, 8, 9].map((day) => `daily-2026-12-0${day}.sqlite`);
    expect(readdirSync(folder()).sort()).toEqual(['before-the-move.sqlite', ...days]);
  });

  it('takes the place of an unfinished one', async () => {
    mkdirSync(folder(), { recursive: true });
    writeFileSync(join(folder(), 'daily-2026-12-01.sqlite.unfinished'), 'broken off');
    await backUpDaily(database(), config(), '2026-12-01');
    await backUpDaily(database(), config(), '2026-12-01');
    expect(readdirSync(folder())).toEqual(['daily-2026-12-01.sqlite']);
  });
});

describe('a daily job', () => {
  it('runs once a day, in one of two workers', async () => {
    let runs = 0;
    const job = daily(`test-${Date.now()}`, async () => {
      runs += 1;
    });
    await Promise.all([job.run(context('one')), job.run(context('two'))]);
    await job.run(context('one'));
    expect(runs).toBe(1);
  });

  it('that failed is tried again', async () => {
    let runs = 0;
    const job = daily(`test-failing-${Date.now()}`, async () => {
      runs += 1;
      if (runs === 1) throw new Error('disk full');
    });
    await expect(job.run(context('one'))).rejects.toThrow('disk full');
    await job.run(context('one'));
    expect(runs).toBe(2);
  });
});

describe('the daily check of the log', () => {
  it('notices a line that was altered behind our back', async () => {
    const scope = await buildShop();
    await inTransaction(scope, (inner) => recordActivity(inner, { kind: 'person.added', details: { n: 1 } }));
    await checkLog.run(context('one'));
    expect(await readAppState(database(), 'log-check')).toBe('intact');

    await allowChanges(database(), 'activity');
    await database()('activity').where({ shop_id: scope.shopId }).update({ details: '{"n":2,"v":1}' });
    await refuseChanges(database(), 'activity');
    await database()('app_state').where({ key: 'daily:check-log' }).delete();
    await checkLog.run(context('one'));
    expect(await readAppState(database(), 'log-check')).toBe('broken');
  });
});
