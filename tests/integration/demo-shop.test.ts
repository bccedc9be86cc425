import { beforeAll, expect, it } from 'vitest';
import { seed as seedShop } from '../../seeds/010_demo_shop.ts';
import { seed as seedTrials } from '../../seeds/020_demo_trials.ts';
import { readVerdict } from '../../src/features/verdict/read-verdict.service.ts';
import { checkActivityChain } from '../../src/server/db/activity-log.ts';
import { database } from '../../src/server/db/connection.ts';
import type { ShopScope } from '../../src/server/db/scope.ts';

let scope: ShopScope;
beforeAll(async () => {
  await seedShop(database());
  await seedTrials(database());
  await seedTrials(database());
  const shop = await database()('shops').where({ name: 'Harrow Lane Foods' }).first('id');
  scope = { db: database(), shopId: shop.id, actor: { kind: 'command', id: null } };
});

it('has a trial that ended, one that runs and one that was only begun, and no second set of them', async () => {
  const trials = await scope.db('trials').where({ shop_id: scope.shopId }).orderBy('number');
  expect(trials.map(({ number, state }) => [number, state])).toEqual([
    [1, 'deciding'],
    [2, 'running'],
    [3, 'draft'],
  ]);
  const runs = await scope.db('runs').where({ shop_id: scope.shopId, trial_id: trials[1].id });
  expect(runs.filter(({ state }) => state === 'done')).toHaveLength(4);
  expect(runs.filter(({ state }) => state === 'waiting').length).toBeGreaterThan(3);
});

it('has a verdict that says what was built into its readings: hotter and longer is stronger', async () => {
  const trial = await scope.db('trials').where({ shop_id: scope.shopId, number: 1 }).first('id');
  const view = await readVerdict(scope, { trialId: trial.id, language: 'en' }, null);
  expect(view?.verdict.headline.kind).toBe('clear-gain');
  expect(view?.verdict.settings.map(({ kind }) => kind).slice(0, 2)).toEqual(['matters', 'matters']);
  expect(view?.bet.coded.slice(0, 2).every((level) => level > 0)).toBe(true);
});

it('has an unbroken record', async () => {
  expect(await checkActivityChain(scope)).toMatchObject({ intact: true });
});
