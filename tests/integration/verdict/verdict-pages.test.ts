import { describe, expect, it } from 'vitest';
import { makeVerdict } from '../../../src/features/verdict/make-verdict.service.ts';
import { readRunningVerdict } from '../../../src/features/verdict/running-verdict.service.ts';
import { readTryable } from '../../../src/features/verdict/try-settings.service.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { buildMeasuredTrial, type ReadRun } from '../../builders/measured-trial.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';

const hotter: ReadRun = ({ coded, order }) => 35 + 4 * (coded[0] ?? 0) + 0.55 * Math.sin(order * 12.9898);

async function setTheScene() {
  const scope = await buildShop({});
  const ownerId = await buildPerson(scope, ['supervisor']);
  const inside: ShopScope = { ...scope, actor: { kind: 'person', id: ownerId } };
  return { scope: inside, id: await buildMeasuredTrial(inside, { ownerId, read: hotter }) };
}

describe('what the page of a verdict reads besides', () => {
  it('gives readings to try settings on only while they are those of the verdict', async () => {
    const { scope, id } = await setTheScene();
    expect(await readTryable(scope, id)).toBeNull();
    await makeVerdict(scope, id);
    expect(await readTryable(scope, id)).toHaveLength(1);
    const run = await scope.db('runs').where({ shop_id: scope.shopId, trial_id: id }).first();
    await scope.db('readings').where({ run_id: run.id }).update({ value: 20 });
    expect(await readTryable(scope, id)).toBeNull();
  });

  it('lets nothing out of a running trial but readings, slow change and odd readings', async () => {
    const { scope, id } = await setTheScene();
    const view = await readRunningVerdict(scope, id);
    expect(view?.runs.every(({ readings }) => (readings[0]?.length ?? 0) > 0)).toBe(true);
    const kinds = view?.facts.map(({ kind }) => kind) ?? [];
    expect(kinds.filter((kind) => !/drift|odd-reading/.test(kind))).toEqual([]);
    expect(JSON.stringify(view)).not.toMatch(/"matters"|"bet"|"headline"/);
  });

  it('is of no other shop', async () => {
    const { id } = await setTheScene();
    const other = await buildShop({});
    await expect(readRunningVerdict(other, id)).rejects.toMatchObject({ code: 'not-found' });
    expect(await readTryable(other, id)).toBeNull();
  });
});
