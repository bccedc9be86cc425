import { describe, expect, it } from 'vitest';
import { carryOutEvent } from '../../../src/features/trial/trial-event.service.ts';
import { findTrialOf } from '../../../src/features/trial/trial-reader.service.ts';
import { makeVerdict } from '../../../src/features/verdict/make-verdict.service.ts';
import { readVerdict } from '../../../src/features/verdict/read-verdict.service.ts';
import type { VerdictView } from '../../../src/features/verdict/verdict-view.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { AppError } from '../../../src/server/errors.ts';
import { buildMeasuredTrial, measureRuns, type ReadRun } from '../../builders/measured-trial.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';

/** Small ups and downs that are the same each time, sd about .4. */
const wobble = (order: number) => 0.55 * Math.sin(order * 12.9898);

/** Hotter is 8 N stronger; nothing else does anything. */
const hotter: ReadRun = ({ coded, order }) => 35 + 4 * (coded[0] ?? 0) + wobble(order);

async function setTheScene(shop: Record<string, unknown> = {}) {
  const scope = await buildShop(shop);
  const ownerId = await buildPerson(scope, ['supervisor']);
  const inside: ShopScope = { ...scope, actor: { kind: 'person', id: ownerId } };
  const reader = { personId: ownerId, roles: ['supervisor'] as const };
  return { scope: inside, ownerId, reader };
}

type Scene = Awaited<ReturnType<typeof setTheScene>>;

async function look({ scope, reader }: Scene, trialId: string): Promise<VerdictView> {
  const view = await readVerdict(scope, { trialId, language: 'en' }, reader);
  if (!view) throw new Error('there is no verdict');
  return view;
}

async function act({ scope, reader }: Scene, trialId: string, event: Record<string, unknown>): Promise<void> {
  const { revision } = await findTrialOf(scope, trialId);
  const body = { revision, note: '', ...event } as Parameters<typeof carryOutEvent>[1]['body'];
  await carryOutEvent(scope, { trialId, body }, reader);
}

const codeOf = (work: Promise<unknown>) =>
  work.then(
    () => 'none',
    (error: unknown) => (error instanceof AppError ? error.code : String(error)),
  );

describe('a verdict', () => {
  it('is made of the readings once, kept, told to the owner and on record', async () => {
    const scene = await setTheScene();
    const id = await buildMeasuredTrial(scene.scope, { ownerId: scene.ownerId, read: hotter });
    expect(await makeVerdict(scene.scope, id)).toBe(true);
    expect(await makeVerdict(scene.scope, id)).toBe(false);
    const view = await look(scene, id);
    expect(view).toMatchObject({ n: 1, state: 'deciding', isLatest: true, mayDecide: true });
    expect(view.verdict.headline.kind).toBe('clear-gain');
    expect(view.bet.keepToday).toBe(false);
    expect(view.verdict.settings[0]?.kind).toBe('matters');
    const mails = await scene.scope.db('messages').where({ shop_id: scene.scope.shopId, trial_id: id });
    expect(mails.map(({ template }) => template)).toEqual(['verdictReady']);
  });

  it('is no other for the same readings, and the next one for a corrected reading', async () => {
    const scene = await setTheScene();
    const id = await buildMeasuredTrial(scene.scope, { ownerId: scene.ownerId, read: hotter });
    await makeVerdict(scene.scope, id);
    const again = () =>
      scene.scope.db('trials').where({ shop_id: scene.scope.shopId, id }).update({ state: 'readings in' });
    await again();
    await makeVerdict(scene.scope, id);
    expect((await look(scene, id)).n).toBe(1);
    const run = await scene.scope.db('runs').where({ shop_id: scene.scope.shopId, trial_id: id }).first();
    await scene.scope.db('readings').where({ run_id: run.id }).update({ value: 20 });
    await again();
    await makeVerdict(scene.scope, id);
    expect((await look(scene, id)).n).toBe(2);
    const first = await readVerdict(scene.scope, { trialId: id, n: 1, language: 'en' }, scene.reader);
    expect(first).toMatchObject({ n: 1, isLatest: false });
  });

  it('waits for the engineer where the rules say so', async () => {
    const scene = await setTheScene({ verdict_review: 'always' });
    await buildPerson(scene.scope, ['engineer'], { password_hash: 'x' });
    const id = await buildMeasuredTrial(scene.scope, { ownerId: scene.ownerId, read: hotter });
    await makeVerdict(scene.scope, id);
    expect(await look(scene, id)).toMatchObject({
      state: 'verdict review',
      reviewDue: true,
      mayDecide: false,
    });
    expect(await codeOf(act(scene, id, { event: 'adopt', unchecked: true, note: 'no time' }))).toBe(
      'not-now',
    );
  });

  it('is not made where nothing was measured', async () => {
    const scene = await setTheScene();
    const id = await buildMeasuredTrial(scene.scope, { ownerId: scene.ownerId, read: () => null });
    expect(await makeVerdict(scene.scope, id)).toBe(false);
    expect(await readVerdict(scene.scope, { trialId: id, language: 'en' }, scene.reader)).toBeNull();
  });

  it('of another shop does not exist', async () => {
    const [one, two] = [await setTheScene(), await setTheScene()];
    const id = await buildMeasuredTrial(one.scope, { ownerId: one.ownerId, read: hotter });
    await makeVerdict(one.scope, id);
    expect(await codeOf(look(two, id))).toBe('not-found');
  });
});

describe('after a verdict', () => {
  it('check runs are planned in one step, judged as a gain, and then the settings may be adopted', async () => {
    const scene = await setTheScene();
    const id = await buildMeasuredTrial(scene.scope, { ownerId: scene.ownerId, read: hotter });
    await makeVerdict(scene.scope, id);
    expect(await codeOf(act(scene, id, { event: 'adopt', unchecked: false }))).toBe('invalid');
    await act(scene, id, { event: 'plan check runs' });
    const before = (await look(scene, id)).plannedRuns;
    const waiting = await scene.scope
      .db('runs')
      .where({ shop_id: scene.scope.shopId, trial_id: id, state: 'waiting' })
      .orderBy('number');
    expect(waiting.length).toBeGreaterThanOrEqual(6);
    expect(waiting[0]?.number).toBe(before + 1);
    expect(waiting.filter(({ group_key }) => group_key === 'best')).toHaveLength(waiting.length / 2);
    // A bad day: all readings 3 N lower; the gain stays.
    await measureRuns(scene.scope, id, (run) => (hotter(run) ?? 0) - 3);
    await scene.scope
      .db('trials')
      .where({ shop_id: scene.scope.shopId, id })
      .update({ state: 'readings in' });
    await makeVerdict(scene.scope, id);
    const view = await look(scene, id);
    expect(view).toMatchObject({ n: 2, state: 'deciding', confirmation: { outcome: 'held' } });
    await act(scene, id, { event: 'adopt', unchecked: false, note: 'from Monday' });
    expect(await look(scene, id)).toMatchObject({
      state: 'closed',
      decisions: [{ outcome: 'adopt', note: 'from Monday' }],
    });
  });

  it('settings that were not checked are taken over only with a reason', async () => {
    const scene = await setTheScene();
    const id = await buildMeasuredTrial(scene.scope, { ownerId: scene.ownerId, read: hotter });
    await makeVerdict(scene.scope, id);
    expect(await codeOf(act(scene, id, { event: 'adopt', unchecked: true }))).toBe('invalid');
    await act(scene, id, { event: 'adopt', unchecked: true, note: 'an urgent order' });
    expect((await look(scene, id)).decisions[0]?.outcome).toBe('adopt unchecked');
  });

  it('an adoption goes to the engineer where the rules say so', async () => {
    const scene = await setTheScene({ adoption_review: 'always' });
    await buildPerson(scene.scope, ['engineer'], { password_hash: 'x' });
    const id = await buildMeasuredTrial(scene.scope, { ownerId: scene.ownerId, read: hotter });
    await makeVerdict(scene.scope, id);
    await act(scene, id, { event: 'adopt', unchecked: true, note: 'an urgent order' });
    expect((await look(scene, id)).state).toBe('adoption review');
  });

  it('a trial is closed without a change, and opened again with a reason', async () => {
    const scene = await setTheScene();
    const id = await buildMeasuredTrial(scene.scope, { ownerId: scene.ownerId, read: hotter });
    await makeVerdict(scene.scope, id);
    await act(scene, id, { event: 'not now', keepToday: true });
    expect((await look(scene, id)).state).toBe('closed');
    await act(scene, id, { event: 'open again', reason: 'The film changed', note: undefined });
    expect(await look(scene, id)).toMatchObject({
      state: 'deciding',
      decisions: [{ outcome: 'opened again' }, {}],
    });
  });
});
