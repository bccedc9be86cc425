import { describe, expect, it } from 'vitest';
import { database } from '../../../src/server/db/connection.ts';
import { buildPerson } from '../../builders/shop.ts';
import { openCrew, passTime, received } from '../message/crew.ts';
import {
  countingOf,
  lastText,
  phoneOf,
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

/** Somebody else of the crew, who has agreed to texts. */
async function addOperator(name: string, more: Record<string, unknown> = {}): Promise<string> {
  const phone = `+1404555${crew.phone.slice(-4)}`;
  return buildPerson(crew.shop, ['operator'], { name, phone, consent: 'agreed', ...more });
}

async function withLab(): Promise<{ shop: RunningShop; minh: string; minhPhone: string }> {
  const minh = await addOperator('Minh', { language: 'vi' });
  const shifts = [{ id: 'day', name: 'Day', runs: crew.ana, measures: minh }];
  const shop = await startTrial(crew, { crew: { shifts } });
  return { shop, minh, minhPhone: await phoneOf(minh) };
}

describe('danger', () => {
  it('holds the trial, tells everybody before anything else, and lets nothing more out', async () => {
    const shop = await startTrial(crew);
    await reply(shop, 'DANGER');
    expect((await trialNow(shop)).state).toBe('held');
    expect((await runNow(shop, 1)).state).toBe('waiting');
    for (const phone of [crew.phone, await phoneOf(shop.dana.personId)]) {
      expect(await lastText(shop, phone)).toBe(
        'STOPPED: Line 3 trial. Make no more runs. Put the usual settings back: JAW TEMP 150, DWELL 0.8, PRESS 3.5. Ask Dana, ext 12.',
      );
    }
    const before = (await received(crew)).length;
    await passTime(60 * minute);
    await work(crew);
    expect((await received(crew)).length).toBe(before);
    await reply(shop, 'DONE');
    expect((await trialNow(shop)).set_back_at).not.toBeNull();
  });

  it('goes out at any hour, and cancels a prompt that has not gone out', async () => {
    const shop = await startTrial(crew);
    const never = JSON.stringify({ v: 1, spans: [] });
    await database()('people').where({ id: crew.ana }).update({ work_hours: never });
    await reply(shop, 'nguy hiem');
    expect(await lastText(shop)).toMatch(/^STOPPED/);
    const waiting = await database()('messages').where({ trial_id: shop.trialId, state: 'waiting' });
    expect(waiting).toEqual([]);
  });
});

describe('STOP with an open run', () => {
  it('ends texts at once, gives the run back and tops the board', async () => {
    const shop = await startTrial(crew);
    await reply(shop, 'STOP');
    expect(await runNow(shop, 1)).toMatchObject({ state: 'waiting', person_id: null });
    expect(await lastText(shop, await phoneOf(shop.dana.personId))).toBe(
      'Ana texted STOP with run 1 on Line 3 open, and gets no more texts. It may mean the machine: go and see now.',
    );
    const problems = await database()('problems').where({ trial_id: shop.trialId });
    expect(problems).toMatchObject([{ kind: 'stop', raised_by: crew.ana, settled_at: null }]);
    await passTime(60 * minute);
    await work(crew);
    expect(await statesOf(shop)).toEqual(Array(11).fill('waiting'));
  });
});

describe('made by one and measured by another', () => {
  it('sends the next run after DONE, and asks the lab for the numbers with run and label', async () => {
    const { shop, minhPhone } = await withLab();
    expect(await lastText(shop)).toContain('Text DONE when made.');
    await passTime(10 * minute);
    await reply(shop, 'done');
    expect(await statesOf(shop)).toEqual(['made', 'asked', ...Array(9).fill('waiting')]);
    expect(await lastText(shop)).toMatch(/^Run 1 is made\. Thanks\.\nLine 3, run 2 of 11\n/);
    expect(await lastText(shop, minhPhone)).toMatch(/^Line 3, luot 1 \(HOLD\) da lam xong, con cho so do\./);
    await passTime(10 * minute);
    await reply(shop, 'done');
    // Two runs wait on the lab's phone: a bare number could be either's.
    await reply(shop, '41.5', minhPhone);
    expect(await lastText(shop, minhPhone)).toMatch(/^41\.5 la cua luot nao\? .*1, 2\.$/);
    await reply(shop, '2', minhPhone);
    expect(await countingOf((await runNow(shop, 2)).id)).toEqual([41.5]);
    expect((await runNow(shop, 1)).state).toBe('made');
    await reply(shop, '1: 40,8', minhPhone);
    expect(await countingOf((await runNow(shop, 1)).id)).toEqual([40.8]);
    expect(await statesOf(shop)).toEqual(['done', 'done', 'asked', ...Array(8).fill('waiting')]);
  });
});

describe('never guessing', () => {
  it('asks whether a very quick number is for this run or the one before', async () => {
    const shop = await startTrial(crew, {
      spare: { runs: '11', hoursOpen: true, moneyOpen: true, minutesPerRun: '15' },
    });
    await passTime(10 * minute);
    await reply(shop, '41.5');
    await reply(shop, '42.1');
    expect(await lastText(shop)).toBe('That was quick. Is 42.1 for run 1 (a fix) or run 2? Text 1 or 2.');
    await reply(shop, '1');
    expect(await countingOf((await runNow(shop, 1)).id)).toEqual([42.1]);
    expect(await statesOf(shop)).toEqual(['done', 'asked', ...Array(9).fill('waiting')]);
    await reply(shop, '40.2');
    await reply(shop, 'run 2');
    expect(await countingOf((await runNow(shop, 2)).id)).toEqual([40.2]);
  });

  it('keeps two readings of one run and asks which is right', async () => {
    const shop = await startTrial(crew);
    await passTime(10 * minute);
    await reply(shop, '41.5');
    await reply(shop, 'run 1: 42.1');
    expect(await lastText(shop)).toBe(
      'Run 1 has 41.5. Now you sent 42.1. Which is right? Text the right number.',
    );
    expect(await countingOf((await runNow(shop, 1)).id)).toEqual([41.5]);
    await reply(shop, '42.1');
    expect(await countingOf((await runNow(shop, 1)).id)).toEqual([42.1]);
    const states = await database()('readings')
      .where({ run_id: (await runNow(shop, 1)).id })
      .pluck('state');
    expect(states.sort()).toEqual(['counts', 'replaced', 'replaced']);
  });

  it('asks for all numbers where parts are missing, and keeps nothing until they are there', async () => {
    const shop = await startTrial(crew, { measuring: { who: 'operator', when: 'atOnce', partsPerRun: '3' } });
    await passTime(10 * minute);
    await reply(shop, '41.5 40.8');
    expect(await lastText(shop)).toMatch(/^Nothing is saved yet\. Run 1\. seal strength: text 3 numbers/);
    expect((await runNow(shop, 1)).state).toBe('asked');
    await reply(shop, '41,5 40,8 42');
    expect(await countingOf((await runNow(shop, 1)).id)).toEqual([41.5, 40.8, 42]);
  });

  it('answers what it cannot read three times an hour at most, then tells Dana', async () => {
    const shop = await startTrial(crew);
    const before = (await received(crew)).length;
    for (const body of ['41 42', '40 41', '39 38', '37 36', '35 34']) await reply(shop, body);
    expect((await received(crew)).length).toBe(before + 3);
    expect(await lastText(shop, await phoneOf(shop.dana.personId))).toMatch(
      /^Ana sent texts that could not be read/,
    );
    const kept = await database()('inbox_texts').where({ person_id: crew.ana, intent: 'reading' });
    expect(kept.map(({ state, run_id }) => [state, run_id !== null])).toEqual(
      Array(5).fill(['set aside', true]),
    );
  });
});

describe('two results', () => {
  const watch = {
    results: [
      { id: 'burnt', name: 'burnt edges', wish: 'less', kind: 'rejects', lotSize: '50', noLimit: true },
    ],
  } as const;

  it('are asked one after the other, or taken in one text', async () => {
    const shop = await startTrial(crew, { watch: { results: [...watch.results] } });
    await passTime(10 * minute);
    await reply(shop, '41.5');
    expect(await lastText(shop)).toBe('Thanks. Now run 1. burnt edges out of 50: text a number, like 3');
    expect(await statesOf(shop)).toEqual(['asked', ...Array(10).fill('waiting')]);
    await reply(shop, '2 of 50');
    expect(await countingOf((await runNow(shop, 1)).id)).toEqual([41.5, 2]);
    await passTime(10 * minute);
    await reply(shop, '40.8, 1/50');
    expect(await countingOf((await runNow(shop, 2)).id)).toEqual([40.8, 1]);
    expect(await statesOf(shop)).toEqual(['done', 'done', 'asked', ...Array(8).fill('waiting')]);
  });
});

describe('no answer', () => {
  it('is reminded twice, then Dana is told once', async () => {
    const shop = await startTrial(crew);
    const start = (await received(crew)).length;
    for (let round = 0; round < 4; round += 1) {
      await passTime(41 * minute);
      await work(crew);
    }
    const texts = (await received(crew)).slice(start);
    expect(texts).toEqual(Array(2).fill(expect.stringMatching(/^Run 1 on Line 3 is still open\. No rush\./)));
    const dana = await received(crew, await phoneOf(shop.dana.personId));
    expect(dana).toEqual(['Line 3, run 1 has no answer yet. Please have a look. Ana has it.']);
    await reply(shop, '41.5');
    expect(await database()('problems').where({ trial_id: shop.trialId }).whereNull('settled_at')).toEqual(
      [],
    );
  });
});

describe('one phone', () => {
  it('makes one run at a time over all trials', async () => {
    const shop = await startTrial(crew);
    const second = await startTrial(crew, { job: { starter: 'sealing', title: 'Other', machine: 'Line 4' } });
    expect((await statesOf(second))[0]).toBe('waiting');
    await passTime(10 * minute);
    await reply(shop, 'skip');
    const asked = await database()('runs').where({ person_id: crew.ana, state: 'asked' });
    expect(asked).toHaveLength(1);
  });

  it('is left alone outside its work hours', async () => {
    const never = JSON.stringify({ v: 1, spans: [] });
    const shop = await startTrial(crew);
    await passTime(10 * minute);
    await database()('people').where({ id: crew.ana }).update({ work_hours: never });
    await reply(shop, '41.5');
    expect(await statesOf(shop)).toEqual(['done', ...Array(10).fill('waiting')]);
    expect(await lastText(shop)).toMatch(/^Run 1 saved: 41\.5\./);
  });
});
