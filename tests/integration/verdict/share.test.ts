import { describe, expect, it } from 'vitest';
import { makeVerdict } from '../../../src/features/verdict/make-verdict.service.ts';
import { readVerdict } from '../../../src/features/verdict/read-verdict.service.ts';
import { listShares } from '../../../src/features/verdict/share.repository.ts';
import { endShare, readShared, shareVerdict } from '../../../src/features/verdict/share.service.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { buildMeasuredTrial, type ReadRun } from '../../builders/measured-trial.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';

const hotter: ReadRun = ({ coded, order }) => 35 + 4 * (coded[0] ?? 0) + 0.55 * Math.sin(order * 12.9898);

async function setTheScene(shop: Record<string, unknown> = {}) {
  const scope = await buildShop(shop);
  const ownerId = await buildPerson(scope, ['supervisor'], { name: 'Wilhelmina Quist' });
  const inside: ShopScope = { ...scope, actor: { kind: 'person', id: ownerId } };
  const id = await buildMeasuredTrial(inside, {
    ownerId,
    read: hotter,
    answers: {
      call: { lines: [{ id: 'day', when: 'Day', whom: 'Wilhelmina Quist, ext 12' }] },
    },
  });
  return { scope: inside, ownerId, id };
}

const visit = (address: string) => ({
  token: address.split('/s/')[1] ?? '',
  network: '192.0.2.1',
  language: 'en',
});

describe('a link to a verdict', () => {
  it('is made where there is a verdict, opens it, and is stored as a hash alone', async () => {
    const { scope, id } = await setTheScene();
    await expect(shareVerdict(scope, id)).rejects.toMatchObject({ code: 'not-now' });
    await makeVerdict(scope, id);
    const { address } = await shareVerdict(scope, id);
    const { token } = visit(address);
    // 128 bits are 22 letters of base64url.
    expect(token).toMatch(/^[\w-]{22}$/);
    const { view } = await readShared(visit(address));
    expect(view.verdict.headline.kind).toBe('clear-gain');
    expect(view.mayDecide).toBe(false);
    expect(JSON.stringify(await scope.db('links').where({ shop_id: scope.shopId }))).not.toContain(token);
  });

  it('names no person and brings no words that somebody typed about one', async () => {
    const { scope, id, ownerId } = await setTheScene();
    await makeVerdict(scope, id);
    const inside = await readVerdict(scope, { trialId: id, language: 'en' }, null);
    expect(JSON.stringify(inside)).toContain('Wilhelmina');
    const { address } = await shareVerdict(scope, id);
    const shared = JSON.stringify(await readShared(visit(address)));
    expect(shared).not.toContain('Wilhelmina');
    expect(shared).not.toContain(ownerId);
  });

  it('opens nothing once it was ended, or after its time, and the others go on', async () => {
    const { scope, id } = await setTheScene();
    await makeVerdict(scope, id);
    const [first, second] = [await shareVerdict(scope, id), await shareVerdict(scope, id)];
    await endShare(scope, { trialId: id, id: first.id });
    await expect(readShared(visit(first.address))).rejects.toMatchObject({ code: 'gone' });
    await expect(endShare(scope, { trialId: id, id: first.id })).rejects.toMatchObject({ code: 'not-found' });
    expect((await listShares(scope, id)).map((share) => share.id)).toEqual([second.id]);
    await readShared(visit(second.address));
    await scope.db('links').where({ id: second.id }).update({ expires_at: 1 });
    await expect(readShared(visit(second.address))).rejects.toMatchObject({ code: 'gone' });
    expect(await listShares(scope, id)).toEqual([]);
  });

  it('is of one shop and of one trial', async () => {
    const here = await setTheScene();
    await makeVerdict(here.scope, here.id);
    const link = await shareVerdict(here.scope, here.id);
    const other = await setTheScene();
    await expect(shareVerdict(other.scope, here.id)).rejects.toMatchObject({ code: 'not-found' });
    await expect(endShare(other.scope, { trialId: here.id, id: link.id })).rejects.toMatchObject({
      code: 'not-found',
    });
    await expect(endShare(other.scope, { trialId: other.id, id: link.id })).rejects.toMatchObject({
      code: 'not-found',
    });
    await readShared(visit(link.address));
  });
});
