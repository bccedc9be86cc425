import { describe, expect, it } from 'vitest';
import { queueMessage } from '../../../src/features/message/message.service.ts';
import { updateRun } from '../../../src/features/run/run.repository.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import { newId } from '../../../src/server/ids.ts';
import { refusalOf } from '../people/people-fixture.ts';
import { allFigures, type BoardScene, buildBoard, kindsOf, recordAll } from './run-fixture.ts';

const stateOf = async (scene: BoardScene) => (await scene.board()).state;

describe('a running trial', () => {
  it('has its readings in with the last run, also when it was paused meanwhile', async () => {
    const scene = await buildBoard();
    await scene.doTrial({ event: 'pause' });
    await recordAll(scene);
    expect(await stateOf(scene)).toBe('paused');
    await scene.doTrial({ event: 'resume', id: newId() });
    expect(await stateOf(scene)).toBe('readings in');
    expect(await kindsOf(scene, 2)).toEqual(['trial.readings-in', 'trial.resumed']);
  });

  it('goes back to running for a run that is put back or made again', async () => {
    const scene = await buildBoard();
    await scene.doRun(1, { event: 'skip' });
    await recordAll(scene);
    expect(await stateOf(scene)).toBe('readings in');
    await scene.doRun(1, { event: 'put back' });
    expect(await stateOf(scene)).toBe('running');
    await scene.doRun(1, { event: 'record', figures: allFigures(36) });
    await scene.doRun(2, { event: 'repeat' });
    expect(await stateOf(scene)).toBe('running');
  });

  it('needs the next verdict, and each agreement anew, once a reading is put right', async () => {
    const scene = await buildBoard();
    await recordAll(scene);
    const { db, shopId } = scene.shop.scope;
    await db('trials').where({ id: scene.trialId }).update({ state: 'deciding' });
    const review = { shop_id: shopId, trial_id: scene.trialId, subject_hash: 'x', round: 1, asked_at: 1 };
    const by = { asked_by: scene.shop.dana.personId };
    await db('reviews').insert([
      { id: newId(), ...review, ...by, subject: 'verdict', state: 'approved' },
      { id: newId(), ...review, ...by, subject: 'plan', state: 'approved' },
    ]);
    const wish = { event: 'correct', figures: [{ result: 0, part: 1, value: 40 }], reason: 'Typed wrong' };
    await scene.doRun(1, wish);
    expect(await stateOf(scene)).toBe('readings in');
    const states = await db('reviews').where({ trial_id: scene.trialId }).orderBy('subject').pluck('state');
    expect(states).toEqual(['approved', 'reopened']);
    await db('trials').where({ id: scene.trialId }).update({ state: 'closed' });
    expect((await refusalOf(scene.doRun(1, wish))).code).toBe('not-now');
  });

  it('ends early: open runs are skipped, those that are done stay', async () => {
    const scene = await buildBoard();
    await scene.doRun(1, { event: 'record', figures: allFigures(36) });
    await scene.doTrial({ event: 'judge' });
    const { runs, state } = await scene.board();
    expect(state).toBe('readings in');
    expect(runs.map((run) => run.state)).toEqual(['done', ...runs.slice(1).map(() => 'skipped')]);
    expect((await kindsOf(scene, 1))[0]).toBe('trial.ended-early');
  });

  it('waits with a problem until somebody deals with it, and notes what was changed', async () => {
    const scene = await buildBoard();
    const { id: runId } = await scene.run(2);
    const problem = { event: 'raise a problem', id: newId(), runId, words: 'jaw not heating' };
    await scene.doTrial(problem);
    await scene.doTrial(problem);
    expect((await scene.board()).problems).toMatchObject([
      { words: 'jaw not heating', runNumber: 2, by: 'Dana' },
    ]);
    const change = { kind: 'repair', words: 'New heater' };
    await scene.doTrial({ event: 'settle a problem', problemId: problem.id, change });
    await scene.doTrial({ event: 'something changed', kind: 'new batch', words: 'B 204' });
    const { problems, stretches } = await scene.board();
    expect(problems).toEqual([]);
    expect(stretches.map(({ n, kind, words }) => [n, kind, words])).toEqual([
      [1, 'start', ''],
      [2, 'repair', 'New heater'],
      [3, 'new batch', 'B 204'],
    ]);
    await scene.doRun(1, { event: 'make' });
    const stretch = await scene.shop.scope.db('stretches').where({ trial_id: scene.trialId, n: 3 }).first();
    const run = await scene.shop.scope.db('runs').where({ trial_id: scene.trialId, number: 1 }).first();
    expect(run?.stretch_id).toBe(stretch?.id);
  });
});

describe('a stop for safety', () => {
  async function stopped() {
    const scene = await buildBoard();
    const { scope, anaId } = scene.shop;
    await scope.db('people').where({ id: anaId }).update({ phone: '+12025550142', consent: 'agreed' });
    const { id } = await scene.run(1);
    await updateRun(scope, { id, from: ['waiting'] }, { state: 'asked', askedAt: 1 });
    await inTransaction(scope, (inner) =>
      queueMessage(inner, {
        personId: anaId,
        template: 'remind',
        params: { run: 1, machine: 'Line 3', later: false },
        dedupe: `remind:${id}`,
        trialId: scene.trialId,
        runId: id,
      }),
    );
    const sam = await scene.shop.add(['engineer']);
    await scene.doTrial({ event: 'hold' }, sam);
    return { scene, sam };
  }

  it('takes back what is in hand, cancels what asks for runs and tells those on shift first', async () => {
    const { scene, sam } = await stopped();
    const { state, runs, stop } = await scene.board();
    expect([state, runs[0]?.state, runs[0]?.askedAt]).toEqual(['held', 'waiting', null]);
    const texts = await scene.shop.scope.db('messages').where({ trial_id: scene.trialId }).orderBy('id');
    expect(texts.map(({ template, state: sent, urgent }) => [template, sent, Boolean(urgent)])).toEqual([
      ['remind', 'cancelled', false],
      ['stopped', 'waiting', true],
      // Whoever answers for the trial hears of it too.
      ['stopped', 'waiting', true],
    ]);
    expect(texts[1]?.body).toContain('JAW TEMP 150');
    expect(stop?.told).toMatchObject([
      { name: 'Ana', text: 'on its way', answeredAt: null },
      { name: 'Dana', text: 'on its way', answeredAt: null },
    ]);
    // Pressed again by somebody whose page is behind: stopped is stopped.
    await scene.doTrial({ event: 'hold' }, sam);
    expect(await kindsOf(scene, 1)).toEqual(['trial.held']);
  });

  it('ends with a written reason, by the engineer where something can hurt', async () => {
    const { scene, sam } = await stopped();
    const again = { event: 'resume', id: newId(), reason: 'Guard is back on' };
    expect((await refusalOf(scene.doTrial(again))).code).toBe('forbidden');
    expect((await scene.board()).events).not.toContain('resume');
    const silent = await refusalOf(scene.doTrial({ event: 'resume', id: newId() }, sam));
    expect(silent.fields).toEqual([{ pointer: '#/reason', code: 'missing' }]);
    await scene.doTrial(again, sam);
    expect(await stateOf(scene)).toBe('running');
    const notes = await scene.shop.scope.db('notes').where({ trial_id: scene.trialId });
    expect(notes).toMatchObject([{ words: 'Guard is back on', written_by: sam.personId }]);
  });

  it('still lets a reading in that was made before', async () => {
    const { scene } = await stopped();
    await scene.doRun(1, { event: 'record', figures: allFigures(36) });
    expect((await scene.run(1)).state).toBe('done');
  });
});
