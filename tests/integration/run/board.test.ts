import { describe, expect, it } from 'vitest';
import { queueMessage } from '../../../src/features/message/message.service.ts';
import { readRunStory } from '../../../src/features/run/read-run-story.service.ts';
import { recordRun } from '../../../src/features/run/record-run.service.ts';
import { updateRun } from '../../../src/features/run/run.repository.ts';
import { listActivity } from '../../../src/server/db/activity-log.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import { newId } from '../../../src/server/ids.ts';
import { attempt, endpoints } from '../api/endpoints.ts';
import { refusalOf } from '../people/people-fixture.ts';
import { allFigures, type BoardScene, buildBoard, recordAll } from './run-fixture.ts';

async function kinds({ shop, trialId }: BoardScene, limit = 5): Promise<string[]> {
  return (await listActivity(shop.scope, { limit, trialId })).map(({ kind }) => kind);
}

const stateOf = async (scene: BoardScene) => (await scene.board()).state;

describe('readings of a run', () => {
  it('come in part by part, from a run that nobody was asked for yet, and close it with the last one', async () => {
    const scene = await buildBoard();
    const [first, second, burnt] = allFigures(36);
    expect(await scene.doRun(1, { event: 'record', figures: [first] })).toMatchObject({
      state: 'made',
      missing: [
        { result: 0, missing: 1 },
        { result: 1, missing: 1 },
      ],
    });
    const done = await scene.doRun(1, { event: 'record', figures: [second, burnt] });
    expect(done).toMatchObject({ state: 'done', end: 'measured', missing: [] });
    const run = await scene.run(1);
    expect(run.figures).toMatchObject([{ value: 36 }, { value: 36.4 }, { rejects: 1, lot: 50, value: null }]);
    expect(run.closedAt).not.toBeNull();
    expect((await kinds(scene))[0]).toBe('run.recorded');
  });

  it('are kept once when they are sent twice, and refused from a page that is behind', async () => {
    const scene = await buildBoard();
    const { id, revision } = await scene.run(1);
    const sent = { runId: id, revision, submission: newId(), source: 'board', enteredBy: null } as const;
    const figures = allFigures(36).map((figure) => ({ value: null, rejects: null, lot: null, ...figure }));
    const wish = { ...sent, figures, end: 'measured' } as const;
    expect((await recordRun(scene.shop.scope, wish)).already).toBe(false);
    expect((await recordRun(scene.shop.scope, wish)).already).toBe(true);
    expect(await scene.shop.scope.db('readings').where({ run_id: id })).toHaveLength(3);
    const behind = scene.doRun(2, { event: 'record', figures: allFigures(36), revision: 7 });
    expect((await refusalOf(behind)).code).toBe('changed-meanwhile');
    expect((await refusalOf(scene.doRun(1, { event: 'record', figures }))).code).toBe('not-now');
  });

  it('are refused by name where they cannot be right, and nothing is kept of them', async () => {
    const scene = await buildBoard();
    const [first] = allFigures(36);
    const wrong = [first, { result: 0, part: 3, value: 1 }, { result: 1, part: 1, rejects: 51 }];
    const refusal = await refusalOf(scene.doRun(1, { event: 'record', figures: wrong }));
    expect(refusal.fields).toEqual([
      { pointer: '#/figures/0-3', code: 'not-a-choice' },
      { pointer: '#/figures/1-1', code: 'off-scale' },
    ]);
    expect((await scene.run(1)).figures).toEqual([]);
    expect((await refusalOf(scene.doRun(1, { event: 'record' }))).fields[0]?.code).toBe('missing');
  });

  it('may be that a run failed or went beyond the gauge, or all that there will be', async () => {
    const scene = await buildBoard();
    const [first] = allFigures(36);
    await scene.doRun(1, { event: 'record', end: 'failed' });
    await scene.doRun(2, { event: 'record', figures: [first] });
    await scene.doRun(2, { event: 'record', end: 'beyondGauge' });
    await scene.doRun(3, { event: 'record', figures: [first], isAll: true });
    const { runs } = await scene.board();
    expect(runs.slice(0, 3).map(({ state, end, figures }) => [state, end, figures.length])).toEqual([
      ['done', 'failed', 0],
      ['done', 'beyondGauge', 0],
      ['done', 'measured', 1],
    ]);
  });

  it('that are doubted are asked back: right ones count, wrong ones are asked for again', async () => {
    const scene = await buildBoard();
    const doubt = async (number: number) => {
      const { id } = await scene.run(number);
      const figures = allFigures(4.1).map((figure) => ({ value: null, rejects: null, lot: null, ...figure }));
      const from = { submission: newId(), source: 'text', enteredBy: scene.shop.anaId } as const;
      await recordRun(scene.shop.scope, { runId: id, figures, end: 'measured', isDoubted: true, ...from });
    };
    await doubt(1);
    await doubt(2);
    expect((await scene.run(1)).figures.every(({ isAskedBack }) => isAskedBack)).toBe(true);
    await scene.doRun(1, { event: 'confirm' });
    await scene.doRun(2, { event: 'deny' });
    expect(await scene.run(1)).toMatchObject({ state: 'done', end: 'measured' });
    expect(await scene.run(2)).toMatchObject({ state: 'made', figures: [] });
  });

  it('are put right with a reason, and the old ones stay on record', async () => {
    const scene = await buildBoard();
    await scene.doRun(1, { event: 'record', figures: allFigures(36) });
    const right = [{ result: 0, part: 2, value: 41 }];
    await scene.doRun(1, { event: 'correct', figures: right, reason: 'Misread the dial' });
    const { id, figures } = await scene.run(1);
    expect(figures.map(({ value }) => value)).toEqual([36, 41, null]);
    const { lines } = await readRunStory(scene.shop.scope, id);
    const readings = lines.filter((line) => line.kind === 'reading');
    expect(readings.map(({ value, state, reason }) => [value, state, reason])).toEqual([
      [36, 'counts', null],
      [36.4, 'replaced', null],
      [null, 'counts', null],
      [41, 'counts', 'Misread the dial'],
    ]);
  });
});

describe('a run', () => {
  it('is skipped, put back, handed over, set otherwise, noted and made again', async () => {
    const scene = await buildBoard();
    const { personId: minh } = await scene.shop.add(['operator'], { name: 'Minh', password_hash: null });
    await scene.doRun(1, { event: 'skip' });
    expect(await scene.run(1)).toMatchObject({ state: 'skipped', end: 'notRun' });
    await scene.doRun(1, { event: 'put back' });
    await scene.doRun(1, { event: 'hand over', personId: minh });
    expect(await scene.run(1)).toMatchObject({ state: 'waiting', end: null, person: { name: 'Minh' } });
    const { planned, revision } = await scene.run(1);
    const actual = [155, ...planned.slice(1)];
    await scene.doRun(1, { event: 'set actual', actual });
    expect((await scene.run(1)).actual).toEqual(actual);
    await scene.doRun(1, { event: 'set actual', actual: planned });
    expect((await scene.run(1)).actual).toBeNull();
    const unfit = await refusalOf(
      scene.doRun(1, { event: 'set actual', actual: ['hot', ...planned.slice(1)] }),
    );
    expect(unfit.fields).toEqual([{ pointer: '#/actual/0', code: 'not-a-number' }]);
    await scene.doRun(1, { event: 'note', words: 'Film tore' });
    await scene.doRun(1, { event: 'record', figures: allFigures(36) });
    const repeat = { event: 'repeat', submission: newId() };
    await scene.doRun(1, repeat);
    await scene.doRun(1, repeat);
    const { runs } = await scene.board();
    expect(runs.filter(({ repeats }) => repeats === 1)).toMatchObject([
      { number: runs.length, planned, state: 'waiting' },
    ]);
    const gone = await refusalOf(scene.doRun(2, { event: 'hand over', personId: newId() }));
    expect(gone.fields[0]?.code).toBe('person-gone');
    expect(revision).toBeGreaterThan(1);
  });

  it('is the supervisor’s to change, and not the engineer’s', async () => {
    const scene = await buildBoard();
    const sam = await scene.shop.add(['engineer']);
    expect((await refusalOf(scene.doRun(1, { event: 'skip' }, sam))).code).toBe('forbidden');
    const { runs, events, mayRun } = await scene.board(sam);
    expect([runs[0]?.events, mayRun]).toEqual([[], false]);
    expect(events).toEqual(['hold']);
    expect((await refusalOf(scene.doTrial({ event: 'pause' }, sam))).code).toBe('forbidden');
  });
});

describe('a running trial', () => {
  it('has its readings in with the last run, also when it was paused meanwhile', async () => {
    const scene = await buildBoard();
    await scene.doTrial({ event: 'pause' });
    await recordAll(scene);
    expect(await stateOf(scene)).toBe('paused');
    await scene.doTrial({ event: 'resume', id: newId() });
    expect(await stateOf(scene)).toBe('readings in');
    expect(await kinds(scene, 2)).toEqual(['trial.readings-in', 'trial.resumed']);
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
    expect((await kinds(scene, 1))[0]).toBe('trial.ended-early');
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
    ]);
    expect(texts[1]?.body).toContain('JAW TEMP 150');
    expect(stop?.told).toEqual([{ name: 'Ana', text: 'on its way', answeredAt: null }]);
    // Pressed again by somebody whose page is behind: stopped is stopped.
    await scene.doTrial({ event: 'hold' }, sam);
    expect(await kinds(scene, 1)).toEqual(['trial.held']);
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

describe('the board', () => {
  it('answers 304 to whoever has its state, until something on it changes', async () => {
    const scene = await buildBoard();
    const endpoint = endpoints.find(
      ({ path, method }) => path === '/api/trials/[id]/board' && method === 'GET',
    );
    if (!endpoint) throw new Error('no endpoint');
    const { personId, roles } = scene.shop.dana;
    const { shopId } = scene.shop.scope;
    const viewer = { personId, shopId, roles: [...roles], sessionHandle: 'here', name: 'Dana' };
    const ask = (etag?: string) =>
      attempt(endpoint, {
        viewer: { ...viewer, shopName: '', timeZone: 'UTC', language: 'en', theme: 'auto' },
        params: { id: scene.trialId },
        headers: etag ? { 'if-none-match': etag } : {},
      });
    const first = await ask();
    const etag = first.headers.get('etag') ?? '';
    expect((await ask(etag)).status).toBe(304);
    await scene.doRun(1, { event: 'note', words: 'Looks fine' });
    const next = await ask(etag);
    expect([next.status, next.headers.get('etag') === etag]).toEqual([200, false]);
  });

  it('does not stand before the start', async () => {
    const scene = await buildBoard();
    await scene.shop.scope.db('trials').where({ id: scene.trialId }).update({ state: 'draft' });
    expect((await refusalOf(scene.board())).code).toBe('not-now');
  });
});
