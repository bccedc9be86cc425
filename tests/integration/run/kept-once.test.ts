import { describe, expect, it } from 'vitest';
import { keepReceivedText } from '../../../src/features/message/inbox.service.ts';
import { holdTrial } from '../../../src/features/run/hold-trial.service.ts';
import { recordRun } from '../../../src/features/run/record-run.service.ts';
import { now } from '../../../src/server/clock.ts';
import { database } from '../../../src/server/db/connection.ts';
import { newId } from '../../../src/server/ids.ts';
import { askNextRuns } from '../../../src/worker/ask-next-runs.ts';
import { readInbox } from '../../../src/worker/read-inbox.ts';
import { openCrew, passTime } from '../message/crew.ts';
import { countingOf, type RunningShop, reply, runNow, startTrial, statesOf, work } from './text-fixture.ts';

const minute = 60_000;
const crew = openCrew();

async function keep(body: string, sentAt: number, providerId = newId()): Promise<void> {
  const media = { items: [], unlisted: 0 };
  await keepReceivedText(crew.shop, { providerId, from: crew.phone, body, media, sentAt });
}

function readAs(workerId: string): Promise<number> {
  return readInbox.run({ db: database(), workerId, stopping: () => false });
}

async function readingsOf(shop: RunningShop): Promise<number[]> {
  const runs = database()('runs').where({ trial_id: shop.trialId }).select('id');
  return database()('readings').whereIn('run_id', runs).orderBy('created_at').pluck('value');
}

describe('a reading is kept once', () => {
  it('however often the service delivers its text', async () => {
    const shop = await startTrial(crew);
    await passTime(10 * minute);
    const at = now();
    for (let time = 0; time < 3; time += 1) await keep('41.5', at, `SM${shop.trialId}`);
    await work(crew);
    await keep('41.5', at, `SM${shop.trialId}`);
    await work(crew);
    expect(await readingsOf(shop)).toEqual([41.5]);
    const saved = await database()('messages').where({ trial_id: shop.trialId, template: 'runPrompt' });
    expect(saved).toHaveLength(2);
  });

  it('in the order in which it was sent, not in which it came', async () => {
    const shop = await startTrial(crew);
    await passTime(30 * minute);
    const at = now();
    await keep('fix 1 42', at - minute);
    await keep('41.5', at - 2 * minute);
    await work(crew);
    expect(await countingOf((await runNow(shop, 1)).id)).toEqual([42]);
    expect(await readingsOf(shop)).toEqual([41.5, 42]);
  });

  it('when two workers read and two ask at the same time', async () => {
    const shop = await startTrial(crew);
    await passTime(10 * minute);
    await keep('41.5', now());
    await Promise.all([readAs('one'), readAs('two')]);
    const ask = (workerId: string) => askNextRuns.run({ db: database(), workerId, stopping: () => false });
    await Promise.all([ask('one'), ask('two'), ask('one')]);
    await work(crew);
    expect(await readingsOf(shop)).toEqual([41.5]);
    expect(await statesOf(shop)).toEqual(['done', 'asked', ...Array(9).fill('waiting')]);
    const prompts = await database()('messages').where({ trial_id: shop.trialId, template: 'runPrompt' });
    expect(prompts).toHaveLength(2);
  });

  it('when the board was quicker than the text, with both on record', async () => {
    const shop = await startTrial(crew);
    await passTime(10 * minute);
    const { id } = await runNow(shop, 1);
    const figures = [{ result: 0, part: 1, value: 41.5, rejects: null, lot: null }];
    const typed = { runId: id, figures, end: 'measured', submission: newId(), source: 'board' } as const;
    await recordRun(shop.scope, { ...typed, enteredBy: shop.dana.personId });
    await keep('run 1: 40', now());
    await readAs('one');
    expect(await countingOf(id)).toEqual([41.5]);
    const states = await database()('readings').where({ run_id: id }).orderBy('created_at').pluck('state');
    expect(states).toEqual(['counts', 'asked back']);
  });

  it('when the trial was stopped before the text came', async () => {
    const shop = await startTrial(crew);
    await passTime(10 * minute);
    await holdTrial(shop.scope, shop.trialId);
    await reply(shop, '41.5');
    expect(await readingsOf(shop)).toEqual([]);
    const [text] = await database()('inbox_texts').where({ person_id: crew.ana });
    expect(text).toMatchObject({ body: '41.5', state: 'set aside' });
  });
});
