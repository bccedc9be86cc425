import { describe, expect, it } from 'vitest';
import { decideReview } from '../../../src/features/trial/review.service.ts';
import { addComment } from '../../../src/features/trial/review-comments.service.ts';
import { carryOutEvent } from '../../../src/features/trial/trial-event.service.ts';
import { findTrialOf } from '../../../src/features/trial/trial-reader.service.ts';
import { answerCheckBack } from '../../../src/features/verdict/check-back.service.ts';
import { readMachineHistory } from '../../../src/features/verdict/machine-history.service.ts';
import { makeVerdict } from '../../../src/features/verdict/make-verdict.service.ts';
import { readSignOff } from '../../../src/features/verdict/read-sign-off.service.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildMeasuredTrial, type ReadRun } from '../../builders/measured-trial.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';

const hotter: ReadRun = ({ coded, order }) => 35 + 4 * (coded[0] ?? 0) + 0.55 * Math.sin(order * 12.9898);

async function setTheScene(shop: Record<string, unknown> = {}, hasEngineer = true) {
  const scope = await buildShop(shop);
  const ownerId = await buildPerson(scope, ['supervisor'], { password_hash: 'x', phone: '+12025550112' });
  const engineerId = hasEngineer ? await buildPerson(scope, ['engineer'], { password_hash: 'x' }) : '';
  const operatorId = await buildPerson(scope, ['operator'], { phone: '+12025550142' });
  const inside: ShopScope = { ...scope, actor: { kind: 'person', id: ownerId } };
  const id = await buildMeasuredTrial(inside, {
    ownerId,
    read: hotter,
    answers: {
      crew: { shifts: [{ id: 'day', name: 'Day', from: '06:00', to: '14:00', runs: operatorId }] },
    },
  });
  await makeVerdict(inside, id);
  return {
    scope: inside,
    id,
    operatorId,
    owner: { personId: ownerId, roles: ['supervisor'] as const },
    engineer: { personId: engineerId, roles: ['engineer'] as const },
  };
}
type Scene = Awaited<ReturnType<typeof setTheScene>>;

async function act({ scope, id, owner }: Scene, event: Record<string, unknown>): Promise<void> {
  const { revision } = await findTrialOf(scope, id);
  const body = { revision, ...event } as Parameters<typeof carryOutEvent>[1]['body'];
  await carryOutEvent(scope, { trialId: id, body }, owner);
}

const stateOf = async ({ scope, id }: Scene) => (await findTrialOf(scope, id)).state;
const adopt = (scene: Scene) => act(scene, { event: 'adopt', unchecked: true, note: 'an urgent order' });

async function decide(scene: Scene, decision: 'approve' | 'send-back'): Promise<void> {
  const { scope, id, engineer } = scene;
  const shown = await readSignOff(scope, await findTrialOf(scope, id), engineer);
  if (!shown) throw new Error('nobody was asked');
  expect(shown.mayDecide).toBe(true);
  if (decision === 'send-back')
    await addComment(
      scope,
      { reviewId: shown.review.id, id: newId(), place: '#', words: 'Run 4?' },
      engineer,
    );
  await decideReview(scope, { id: shown.review.id, round: shown.review.round, decision }, engineer);
}

const messagesOf = async ({ scope, id }: Scene, personId: string) => {
  const rows = await scope
    .db('messages')
    .where({ shop_id: scope.shopId, trial_id: id, person_id: personId })
    .orderBy('created_at');
  return rows.map(({ template }) => String(template));
};

describe('an engineer’s word on a verdict', () => {
  it('is asked for by mail, opens the decision, and is told', async () => {
    const scene = await setTheScene({ verdict_review: 'always' });
    expect(await stateOf(scene)).toBe('verdict review');
    expect(await messagesOf(scene, scene.engineer.personId)).toContain('signOffWaiting');
    await decide(scene, 'approve');
    expect(await stateOf(scene)).toBe('deciding');
    expect(await messagesOf(scene, scene.owner.personId)).toContain('signOffApproved');
  });

  it('sent back, waits for another reading or for being asked again, and not for the clock', async () => {
    const scene = await setTheScene({ verdict_review: 'always' });
    await decide(scene, 'send-back');
    expect(await stateOf(scene)).toBe('readings in');
    expect(await makeVerdict(scene.scope, scene.id)).toBe(false);
    const shown = await readSignOff(scene.scope, await findTrialOf(scene.scope, scene.id), scene.owner);
    expect(shown).toMatchObject({ mayAskAgain: true, review: { comments: [{ words: 'Run 4?' }] } });
    expect(await messagesOf(scene, scene.owner.personId)).toContain('signOffSentBackText');
    await act(scene, { event: 'send for review' });
    expect(await stateOf(scene)).toBe('verdict review');
    await decide(scene, 'approve');
    expect(await stateOf(scene)).toBe('deciding');
  });

  it('that nobody can give stands on record and holds nothing up', async () => {
    const scene = await setTheScene({ verdict_review: 'always' }, false);
    expect(await stateOf(scene)).toBe('deciding');
    const trial = await findTrialOf(scene.scope, scene.id);
    expect((await readSignOff(scene.scope, trial, scene.owner))?.review.state).toBe('unchecked');
  });
});

describe('settings that are used from now on', () => {
  it('are told to the crew by text, to the planner by mail, and asked after a week later', async () => {
    const scene = await setTheScene();
    await adopt(scene);
    expect(await messagesOf(scene, scene.operatorId)).toContain('settingsInUseText');
    expect(await messagesOf(scene, scene.owner.personId)).toEqual(
      expect.arrayContaining(['settingsInUse', 'checkBack', 'checkBackText']),
    );
    const [later] = await scene.scope.db('messages').where({ trial_id: scene.id, template: 'checkBackText' });
    expect((later.not_before - later.created_at) / 3_600_000).toBeCloseTo(7 * 24, 1);
  });

  it('wait for the engineer where the rules say so, and are nobody’s before', async () => {
    const scene = await setTheScene({ adoption_review: 'always' });
    await adopt(scene);
    expect(await stateOf(scene)).toBe('adoption review');
    expect(await messagesOf(scene, scene.operatorId)).toEqual([]);
    expect((await readMachineHistory(scene.scope, 'Line 3')).inUse).toBeNull();
    await decide(scene, 'send-back');
    expect(await stateOf(scene)).toBe('deciding');
    await adopt(scene);
    await decide(scene, 'approve');
    expect(await stateOf(scene)).toBe('closed');
    expect(await messagesOf(scene, scene.operatorId)).toContain('settingsInUseText');
  });

  it('cannot be agreed to by whoever asked, nor asked of nobody', async () => {
    const scene = await setTheScene({ adoption_review: 'always' }, false);
    await expect(adopt(scene)).rejects.toMatchObject({ code: 'no-reviewer' });
    expect(await stateOf(scene)).toBe('deciding');
  });

  it('stand in the machine’s history with what came of them, until the trial is opened again', async () => {
    const scene = await setTheScene();
    await expect(
      answerCheckBack(scene.scope, { trialId: scene.id, holds: true, note: '' }, scene.owner),
    ).rejects.toMatchObject({ code: 'not-now' });
    await adopt(scene);
    const history = await readMachineHistory(scene.scope, ' line 3 ');
    expect(history.inUse).toMatchObject({ trialId: scene.id, unchecked: true });
    expect(history.inUse?.settings[0]).toEqual({ name: 'JAW TEMP', value: 160, unit: 'C' });
    await answerCheckBack(scene.scope, { trialId: scene.id, holds: false, note: 'drifts' }, scene.owner);
    expect((await readMachineHistory(scene.scope, 'Line 3')).trials[0]?.outcome).toBe('does not hold');
    const left = await scene.scope
      .db('messages')
      .where({ trial_id: scene.id, state: 'waiting' })
      .whereIn('template', ['checkBack', 'checkBackText']);
    expect(left).toEqual([]);
    await act(scene, { event: 'open again', reason: 'It does not hold' });
    expect((await readMachineHistory(scene.scope, 'Line 3')).inUse).toBeNull();
  });

  it('are of one shop', async () => {
    const scene = await setTheScene();
    await adopt(scene);
    const other = await buildShop({});
    expect(await readMachineHistory(other, 'Line 3')).toEqual({ inUse: null, trials: [] });
  });
});
