import { describe, expect, it } from 'vitest';
import { readRunStory } from '../../../src/features/run/read-run-story.service.ts';
import { recordRun } from '../../../src/features/run/record-run.service.ts';
import { newId } from '../../../src/server/ids.ts';
import { attempt, endpoints } from '../api/endpoints.ts';
import { refusalOf } from '../people/people-fixture.ts';
import { allFigures, buildBoard, kindsOf } from './run-fixture.ts';

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
    expect((await kindsOf(scene))[0]).toBe('run.recorded');
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
    await scene.doRun(2, { event: 'record', figures: allFigures(36).slice(0, 1) });
    const behind = scene.doRun(2, { event: 'record', figures: allFigures(37), revision });
    expect((await refusalOf(behind)).code).toBe('changed-meanwhile');
    expect((await refusalOf(scene.doRun(1, { event: 'record', figures }))).code).toBe('not-now');
  });

  it('are kept although the run went out while they were typed', async () => {
    const scene = await buildBoard();
    const { id, revision } = await scene.run(2);
    await scene.shop.scope
      .db('runs')
      .where({ id })
      .update({ revision: revision + 1 });
    await scene.doRun(2, { event: 'record', figures: allFigures(36), revision });
    expect((await scene.run(2)).state).toBe('done');
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
