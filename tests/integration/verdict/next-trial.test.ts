import { describe, expect, it } from 'vitest';
import { readStoredAnswers } from '../../../src/features/trial/answers.repository.ts';
import { toBrief } from '../../../src/features/trial/to-brief.ts';
import { makeVerdict } from '../../../src/features/verdict/make-verdict.service.ts';
import { findFollowed, listFollowing } from '../../../src/features/verdict/next-trial.repository.ts';
import { beginNextTrial } from '../../../src/features/verdict/next-trial.service.ts';
import { proposePlans } from '../../../src/lib/doe/index.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildMeasuredTrial, type ReadRun } from '../../builders/measured-trial.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';

const hotter: ReadRun = ({ coded, order }) => 35 + 4 * (coded[0] ?? 0) + 0.55 * Math.sin(order * 12.9898);

async function setTheScene() {
  const scope = await buildShop({});
  const ownerId = await buildPerson(scope, ['supervisor']);
  const inside: ShopScope = { ...scope, actor: { kind: 'person', id: ownerId } };
  const id = await buildMeasuredTrial(inside, { ownerId, read: hotter });
  return { scope: inside, id, reader: { personId: ownerId, roles: ['supervisor'] as const } };
}

describe('the trial that follows', () => {
  it('begins once, filled in, and can be planned as it stands', async () => {
    const { scope, id, reader } = await setTheScene();
    const wish = { trialId: id, id: newId(), reason: 'move-window' as const };
    await expect(beginNextTrial(scope, wish, reader)).rejects.toMatchObject({ code: 'not-now' });
    await makeVerdict(scope, id);
    const next = await beginNextTrial(scope, wish, reader);
    expect(await beginNextTrial(scope, wish, reader)).toEqual(next);
    expect(next).toMatchObject({ state: 'draft', title: 'Line 3 seals 2', machine: 'Line 3' });
    expect(await findFollowed(scope, next.id)).toMatchObject({ trial: { id }, reason: 'move-window' });
    expect(await listFollowing(scope, id)).toHaveLength(1);
    const { answers } = await readStoredAnswers(scope, next.id);
    expect(answers.settings?.settings[0]).toMatchObject({ low: '145', high: '165', usual: '150' });
    const read = toBrief(answers);
    if ('problems' in read) throw new Error(JSON.stringify(read.problems));
    expect(proposePlans(read.brief).length).toBeGreaterThan(0);
    const kinds = await scope.db('activity').where({ shop_id: scope.shopId }).pluck('kind');
    expect(kinds).toContain('trial.followed');
  });

  it('is not begun by a reason that the verdict does not give, nor in another shop', async () => {
    const { scope, id, reader } = await setTheScene();
    await makeVerdict(scope, id);
    const wish = { trialId: id, id: newId() };
    await expect(beginNextTrial(scope, { ...wish, reason: 'narrow-range' }, reader)).rejects.toMatchObject({
      code: 'not-now',
    });
    const other = await setTheScene();
    await expect(
      beginNextTrial(other.scope, { ...wish, reason: 'move-window' }, other.reader),
    ).rejects.toMatchObject({ code: 'not-found' });
  });
});
