import { describe, expect, it } from 'vitest';
import { readAuditFrame } from '../../../src/features/audit/read-frame.service.ts';
import { pickSubject, readSignOffs } from '../../../src/features/audit/read-sign-offs.service.ts';
import { correctReading } from '../../../src/features/run/correct-reading.service.ts';
import { decideReview } from '../../../src/features/trial/review.service.ts';
import { addComment } from '../../../src/features/trial/review-comments.service.ts';
import { carryOutEvent } from '../../../src/features/trial/trial-event.service.ts';
import { findTrialOf } from '../../../src/features/trial/trial-reader.service.ts';
import { makeVerdict } from '../../../src/features/verdict/make-verdict.service.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildMeasuredTrial, type ReadRun } from '../../builders/measured-trial.ts';
import { refusalOf } from '../people/people-fixture.ts';
import { act, buildPlanned, buildTrialShop } from '../trial/trial-fixture.ts';

const hotter: ReadRun = ({ coded, order }) => 35 + 4 * (coded[0] ?? 0) + 0.55 * Math.sin(order * 12.9898);

async function setTheScene(rules: Record<string, unknown>) {
  const shop = await buildTrialShop(rules);
  const sam = await shop.add(['engineer'], { name: 'Sam' });
  const scope = shop.as(sam);
  const trialId = await buildMeasuredTrial(shop.scope, { ownerId: shop.dana.personId, read: hotter });
  await makeVerdict(shop.scope, trialId);
  const waiting = async () => {
    const found = (await readSignOffs(scope, trialId, sam)).find(({ state }) => state === 'asked');
    if (!found) throw new Error('nothing waits');
    return found;
  };
  const state = async () => (await findTrialOf(scope, trialId)).state;
  return { shop, sam, scope, trialId, waiting, state };
}

type Scene = Awaited<ReturnType<typeof setTheScene>>;

/** Puts another figure in the place of that of run 1, as the supervisor does. */
async function correct({ shop, trialId }: Scene): Promise<void> {
  const run = await shop.scope
    .db('runs')
    .where({ shop_id: shop.scope.shopId, trial_id: trialId, number: 1 })
    .first();
  await shop.scope.db('readings').where({ run_id: run.id }).update({ part: 1 });
  await correctReading(shop.scope, {
    runId: run.id,
    figures: [{ result: 0, part: 1, value: 20, rejects: null, lot: null }],
    end: 'measured',
    submission: newId(),
    source: 'board',
    enteredBy: shop.dana.personId,
    reason: 'misread',
  });
}

async function adopt({ shop, trialId }: Scene): Promise<void> {
  const { revision } = await findTrialOf(shop.scope, trialId);
  const body = { event: 'adopt' as const, revision, unchecked: true, note: 'an urgent order' };
  await carryOutEvent(shop.scope, { trialId, body }, shop.dana);
}

describe('the sign-off of a verdict', () => {
  it('waits on the audit, is commented on line by line and approved by an engineer, never by who asked', async () => {
    const scene = await setTheScene({ verdict_review: 'always' });
    const { shop, sam, scope, trialId } = scene;
    expect(await readAuditFrame(scope, trialId)).toMatchObject({ waitsFor: 'verdict', isJudged: true });
    const review = await scene.waiting();
    expect(review).toMatchObject({ subject: 'verdict', mayDecide: true, round: 1 });
    const remark = { id: newId(), place: '#/verdict/settings/0', words: 'Look at the residual of run 7' };
    const commented = await addComment(scope, { ...remark, reviewId: review.id }, sam);
    expect(commented.comments).toMatchObject([{ place: '#/verdict/settings/0', by: 'Sam' }]);
    const wish = { id: review.id, round: 1, decision: 'approve' as const };
    const own = { ...shop.dana, roles: ['supervisor', 'engineer'] as const };
    expect((await refusalOf(decideReview(shop.scope, wish, own))).code).toBe('own-review');
    expect(await decideReview(scope, wish, sam)).toMatchObject({ state: 'approved', holds: true });
    expect(await scene.state()).toBe('deciding');
    expect((await readAuditFrame(scope, trialId)).waitsFor).toBeNull();
  });

  it('holds for exactly these readings: a corrected one reopens it', async () => {
    const scene = await setTheScene({ verdict_review: 'always' });
    const { id, round } = await scene.waiting();
    await decideReview(scene.scope, { id, round, decision: 'approve' }, scene.sam);
    await correct(scene);
    const [reopened] = await readSignOffs(scene.scope, scene.trialId, scene.sam);
    expect(reopened).toMatchObject({ state: 'reopened', holds: false });
    await makeVerdict(scene.shop.scope, scene.trialId);
    expect(await scene.waiting()).toMatchObject({ subject: 'verdict', round: 2 });
    const old = decideReview(scene.scope, { id, round, decision: 'approve' }, scene.sam);
    expect((await refusalOf(old)).code).toBe('changed-meanwhile');
  });

  it('is sent back, and the remark stays with the next round', async () => {
    const scene = await setTheScene({ verdict_review: 'always' });
    const { id, round } = await scene.waiting();
    await addComment(
      scene.scope,
      { reviewId: id, id: newId(), place: '#/verdict/headline', words: 'Run 1?' },
      scene.sam,
    );
    await decideReview(scene.scope, { id, round, decision: 'send-back' }, scene.sam);
    expect(await scene.state()).toBe('readings in');
    await correct(scene);
    await makeVerdict(scene.shop.scope, scene.trialId);
    const next = await scene.waiting();
    expect(next).toMatchObject({ round: 2, comments: [{ words: 'Run 1?' }] });
  });
});

describe('the sign-off of an adoption', () => {
  it('is approved, or sent back to the decision', async () => {
    const scene = await setTheScene({ verdict_review: 'never', adoption_review: 'always' });
    await adopt(scene);
    const first = await scene.waiting();
    expect(first).toMatchObject({ subject: 'adoption', mayDecide: true });
    await decideReview(scene.scope, { ...first, decision: 'send-back' }, scene.sam);
    expect(await scene.state()).toBe('deciding');
    await adopt(scene);
    const second = await scene.waiting();
    await decideReview(scene.scope, { ...second, decision: 'approve' }, scene.sam);
    expect(await scene.state()).toBe('closed');
  });

  it('is taken back by a correction: another verdict is due first', async () => {
    const scene = await setTheScene({ verdict_review: 'never', adoption_review: 'always' });
    await adopt(scene);
    const { id, round } = await scene.waiting();
    await correct(scene);
    expect(await scene.state()).toBe('readings in');
    const late = decideReview(scene.scope, { id, round, decision: 'approve' }, scene.sam);
    expect((await refusalOf(late)).code).toBe('not-now');
  });
});

describe('the sign-off of a plan', () => {
  it('waits on the audit too', async () => {
    const shop = await buildTrialShop();
    const sam = await shop.add(['engineer'], { name: 'Sam' });
    const id = await buildPlanned(shop);
    await act(shop, id, 'send for review');
    expect(await readAuditFrame(shop.as(sam), id)).toMatchObject({ waitsFor: 'plan', isJudged: false });
    const reviews = await readSignOffs(shop.as(sam), id, sam);
    expect(pickSubject(reviews, null)).toBe('plan');
    expect(pickSubject(reviews, 'adoption')).toBe('plan');
  });
});
