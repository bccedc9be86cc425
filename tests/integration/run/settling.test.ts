import { describe, expect, it, vi } from 'vitest';
import { readBoard } from '../../../src/features/run/read-board.service.ts';
import { readPhoneToCall } from '../../../src/features/run/read-phone.service.ts';
import { runEventSchema } from '../../../src/features/run/run-event.schema.ts';
import { carryOutRunEvent } from '../../../src/features/run/run-event.service.ts';
import { trialEventSchema } from '../../../src/features/trial/trial.schema.ts';
import { carryOutEvent } from '../../../src/features/trial/trial-event.service.ts';
import type { TrialReader } from '../../../src/features/trial/trial-reader.service.ts';
import { listActivity } from '../../../src/server/db/activity-log.ts';
import { database } from '../../../src/server/db/connection.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildPerson } from '../../builders/shop.ts';
import { openCrew, passTime } from '../message/crew.ts';
import {
  lastText,
  type RunningShop,
  reply,
  runNow,
  startTrial,
  statesOf,
  trialNow,
  work,
} from './text-fixture.ts';

const minute = 60_000;
const crew = openCrew();

const boardOf = (shop: RunningShop, reader: TrialReader = shop.dana) =>
  readBoard(shop.as(reader), shop.trialId, reader);

async function doTrial(shop: RunningShop, event: Record<string, unknown>, reader = shop.dana) {
  const { revision } = await boardOf(shop);
  const needs = ['pause', 'resume', 'judge'].includes(String(event['event']));
  const body = trialEventSchema.parse({ ...(needs ? { revision } : {}), ...event });
  await carryOutEvent(shop.as(reader), { trialId: shop.trialId, body }, reader);
  await work(crew);
}

async function doRun(shop: RunningShop, place: number, event: Record<string, unknown>) {
  const { id, revision } = await runNow(shop, place);
  const body = runEventSchema.parse({ submission: newId(), revision, ...event });
  await carryOutRunEvent(shop.scope, { runId: id, body }, shop.dana);
  await work(crew);
}

describe('a setting that cannot be reached', () => {
  async function cannot(): Promise<{ shop: RunningShop; problemId: string }> {
    const shop = await startTrial(crew);
    await passTime(5 * minute);
    await reply(shop, 'cant jaw temp 155');
    const [problem] = (await boardOf(shop)).problems;
    expect(problem).toMatchObject({ kind: 'cannot', blocks: false, runNumber: 1 });
    expect((await runNow(shop, 1)).remind_at).toBeNull();
    return { shop, problemId: problem?.id ?? '' };
  }
  const settle = { event: 'settle a problem' };

  it('is made with what was reached: the run stays, and is reminded of again', async () => {
    const { shop, problemId } = await cannot();
    const actual = [155, 0.8, 3.5];
    await doRun(shop, 1, { event: 'set actual', actual });
    await doTrial(shop, { ...settle, problemId, decision: 'use' });
    expect(await lastText(shop)).toBe('Line 3, run 1: make it with what you reached. Then text the numbers.');
    const run = await runNow(shop, 1);
    expect(run).toMatchObject({ state: 'asked', actual: JSON.stringify({ v: 1, values: actual }) });
    expect(run.remind_at).not.toBeNull();
    expect((await boardOf(shop)).problems).toEqual([]);
  });

  it('is made later: the run takes its turn after all others, and the next one goes out', async () => {
    const { shop, problemId } = await cannot();
    const { id } = await runNow(shop, 1);
    await doTrial(shop, { ...settle, problemId, decision: 'later' });
    await passTime(minute);
    await work(crew);
    const runs = (await boardOf(shop)).runs;
    expect(runs.map(({ number }) => number)).toEqual([2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 1]);
    expect(runs.map(({ state }) => state)).toEqual(['asked', ...Array(10).fill('waiting')]);
    expect(runs.at(-1)?.id).toBe(id);
    expect(await lastText(shop)).toMatch(/^Line 3, run 2 of 11/);
  });

  it('is ruled out: the run is skipped, and said to be no loss', async () => {
    const { shop, problemId } = await cannot();
    await doTrial(shop, { ...settle, problemId, decision: 'rule out' });
    await passTime(minute);
    await work(crew);
    expect((await statesOf(shop)).slice(0, 2)).toEqual(['skipped', 'asked']);
  });
});

describe('nobody answers', () => {
  it('says so once the reminders are used up, until somebody does', async () => {
    const shop = await startTrial(crew);
    for (let round = 0; round < 4; round += 1) {
      await passTime(41 * minute);
      await work(crew);
    }
    expect((await boardOf(shop)).runs[0]?.unanswered).toBe('reminded');
    await reply(shop, '41.5');
    expect((await boardOf(shop)).runs.every(({ unanswered }) => unanswered === null)).toBe(true);
  });

  it('says that texts do not arrive after two, and a run that was handed over starts afresh', async () => {
    const other = await buildPerson(crew.shop, ['operator'], {
      ...{ name: 'Bo', phone: `+1505555${crew.phone.slice(-4)}`, consent: 'agreed' },
    });
    // Whatever goes out until it is over: trials of the tests before still remind their people too.
    await crew.desk.setFaults({ undeliverNext: { count: 100, errorCode: 30_003 } });
    const shop = await startTrial(crew);
    await passTime(41 * minute);
    await work(crew);
    await crew.desk.setFaults({ undeliverNext: { count: 0, errorCode: 30_003 } });
    await vi.waitFor(
      async () => {
        expect((await boardOf(shop)).runs[0]?.unanswered).toBe('undelivered');
      },
      { timeout: 15_000 },
    );
    await doRun(shop, 1, { event: 'hand over', personId: other });
    await passTime(minute);
    await work(crew);
    expect((await boardOf(shop)).runs[0]).toMatchObject({ unanswered: null, person: { name: 'Bo' } });
  });
});

describe('the next run', () => {
  it('goes out now where the supervisor says so, and only one at a time', async () => {
    const date = new Date(Date.now() + 30 * 86_400_000).toISOString().slice(0, 10);
    const shop = await startTrial(crew, { pace: { next: 'made', startDate: date, startTime: '06:00' } });
    expect((await statesOf(shop))[0]).toBe('waiting');
    await doRun(shop, 1, { event: 'send now' });
    expect(await lastText(shop)).toMatch(/^Line 3, run 1 of 11/);
    await expect(doRun(shop, 2, { event: 'send now' })).rejects.toMatchObject({ code: 'not-now' });
  });

  it('may be a warm-up that does not count, at the usual settings', async () => {
    const shop = await startTrial(crew);
    const id = newId();
    await doTrial(shop, { event: 'add a run', id, kind: 'warm-up' });
    await doTrial(shop, { event: 'add a run', id, kind: 'warm-up' });
    await passTime(10 * minute);
    await reply(shop, '41.5');
    expect(await lastText(shop)).toMatch(/\nLine 3, run 12: warm-up, does not count\nJAW TEMP 150\n/);
    const runs = (await boardOf(shop)).runs;
    expect(runs).toHaveLength(12);
    expect(runs[1]).toMatchObject({ number: 12, warmUp: true, state: 'asked', planned: [150, 0.8, 3.5] });
    await passTime(10 * minute);
    await reply(shop, '40');
    expect(await lastText(shop)).toMatch(/\nLine 3, run 2 of 12\n/);
  });

  it('may be a middle run after a long stop, which counts as one of those in the plan', async () => {
    const shop = await startTrial(crew);
    await doTrial(shop, { event: 'something changed', kind: 'long stop', words: '' });
    await doTrial(shop, { event: 'add a run', id: newId(), kind: 'middle' });
    const [, second] = (await boardOf(shop)).runs;
    expect(second).toMatchObject({ number: 12, center: true, warmUp: false, planned: [150, 0.8, 3.5] });
    expect(second?.repeats).not.toBeNull();
  });
});

describe('after the end', () => {
  it('says that the machine is not set back until somebody says it is', async () => {
    const shop = await startTrial(crew);
    await expect(doTrial(shop, { event: 'back to usual' })).rejects.toMatchObject({ code: 'not-now' });
    await doTrial(shop, { event: 'judge' });
    expect((await boardOf(shop)).setBack).toBe('asked');
    await doTrial(shop, { event: 'back to usual' });
    expect((await boardOf(shop)).setBack).toBe('done');
    const kinds = (await listActivity(shop.scope, { limit: 5, trialId: shop.trialId })).map(
      ({ kind }) => kind,
    );
    expect(kinds).toContain('trial.set-back');
  });
});

describe('a stop for safety', () => {
  it('names who was not reached and shows a number only then, only to whom it may, and on record', async () => {
    const shop = await startTrial(crew);
    const engineer = await shop.add(['engineer']);
    await database()('people').where({ id: crew.ana }).update({ phone: null });
    const call = (reader: TrialReader, personId: string) =>
      readPhoneToCall(shop.as(reader), { trialId: shop.trialId, personId }, reader);
    await expect(call(shop.dana, crew.ana)).rejects.toMatchObject({ code: 'not-now' });
    const safety = await shop.add(['engineer'], { safety_person: true });
    await doTrial(shop, { event: 'hold' }, safety);
    const told = (await boardOf(shop)).stop?.told ?? [];
    expect(told.map(({ name, text, mayCall }) => [name, text, mayCall])).toEqual([
      ['Dana', expect.stringMatching(/sent|got/), true],
      ['Ana', 'no phone', false],
    ]);
    expect((await boardOf(shop, engineer)).stop?.told.some(({ mayCall }) => mayCall)).toBe(false);
    await expect(call(engineer, shop.dana.personId)).rejects.toMatchObject({ code: 'forbidden' });
    await expect(call(shop.dana, crew.ana)).rejects.toMatchObject({ code: 'not-found' });
    await expect(call(shop.dana, engineer.personId)).rejects.toMatchObject({ code: 'not-found' });
    const other = await shop.add(['admin']);
    expect((await call(other, shop.dana.personId)).phone).toMatch(/^\+1303555/);
    const [read] = await listActivity(shop.scope, { limit: 1, trialId: shop.trialId });
    expect(read).toMatchObject({ kind: 'phone.read', subject_id: shop.dana.personId });
  });

  it('by DANGER counts while the trial is paused as well: everybody is told', async () => {
    const shop = await startTrial(crew);
    await doTrial(shop, { event: 'pause' });
    await reply(shop, 'DANGER');
    expect((await trialNow(shop)).state).toBe('held');
    expect(await lastText(shop)).toMatch(/^STOPPED: Line 3 trial\./);
    expect((await runNow(shop, 1)).state).toBe('waiting');
  });
});
