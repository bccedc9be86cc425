import { afterEach, describe, expect, it } from 'vitest';
import type { Faults } from '../../../src/fakes/text-service/faults.ts';
import { catchUpTexts } from '../../../src/features/message/catching-up.service.ts';
import { settleUnsureTexts } from '../../../src/features/message/settling.service.ts';
import { now } from '../../../src/server/clock.ts';
import { database } from '../../../src/server/db/connection.ts';
import { openCrew, passTime, received } from '../message/crew.ts';
import { countingOf, type RunningShop, runNow, startTrial, statesOf, work } from './text-fixture.ts';

const minute = 60_000;
const crew = openCrew();
afterEach(async () => {
  await fetch(`${crew.desk.textsUrl}/fake/faults`, { method: 'DELETE' });
  // The next test's faults are for its own trial's texts.
  await database()('trials').update({ state: 'closed' });
});

/** The worker as it goes on in earnest: what is unsure is settled, what was missed is found. */
async function live(rounds: number, stepMilliseconds: number): Promise<void> {
  for (let round = 0; round < rounds; round += 1) {
    await passTime(stepMilliseconds);
    await catchUpTexts(database(), crew.desk.gateway);
    await settleUnsureTexts(database(), crew.desk.gateway);
    await work(crew);
  }
}

async function textIn(body: string): Promise<void> {
  await crew.desk.textFromPhone({ from: crew.phone, to: crew.number, body });
}

async function inboxRows(): Promise<number> {
  return (await database()('inbox_texts').where({ person_id: crew.ana })).length;
}

/** Run 1 was answered while the fault lasted: its reading is kept once, and run 2 reached the phone. */
async function expectGoneOn(shop: RunningShop, prompts: number): Promise<void> {
  expect(await countingOf((await runNow(shop, 1)).id)).toEqual([41.5]);
  expect(await inboxRows()).toBe(1);
  expect((await statesOf(shop)).slice(0, 2)).toEqual(['done', 'asked']);
  const second = (await received(crew)).filter((body) => body.includes('run 2 of 11'));
  expect(second).toHaveLength(prompts);
}

const lived: { name: string; faults: (at: number) => Partial<Faults>; rounds: number; step: number }[] = [
  {
    name: 'too many requests, twice',
    faults: () => ({ failNextSends: { count: 2, status: 429, retryAfterSeconds: 30 } }),
    rounds: 3,
    step: 40_000,
  },
  {
    name: 'an error of its own, three times',
    faults: () => ({ failNextSends: { count: 3, status: 500 } }),
    rounds: 4,
    step: 80_000,
  },
  {
    name: 'an answer that never comes',
    faults: () => ({ swallowNextAnswers: 1 }),
    rounds: 2,
    step: 70_000,
  },
  { name: 'everything told twice', faults: () => ({ duplicateWebhooks: true }), rounds: 2, step: 1_000 },
  {
    name: 'everything told late',
    faults: () => ({ delayWebhooks: { upToMilliseconds: 400 } }),
    rounds: 3,
    step: 1_000,
  },
  {
    name: 'everything told in the wrong order',
    faults: () => ({ reverseWebhooks: { gatherMilliseconds: 100 }, duplicateWebhooks: true }),
    rounds: 3,
    step: 1_000,
  },
  { name: 'nothing told at all', faults: () => ({ webhooks: 'off' }), rounds: 2, step: 1_000 },
  {
    name: 'an hour without the service',
    faults: (at) => ({ downUntil: at + 60 * minute }),
    rounds: 8,
    step: 10 * minute,
  },
];

describe('a trial goes on through', () => {
  for (const { name, faults, rounds, step } of lived) {
    it(name, async () => {
      const shop = await startTrial(crew);
      await passTime(10 * minute);
      await crew.desk.setFaults(faults(now()));
      await textIn('41.5');
      await live(rounds, step);
      await expectGoneOn(shop, 1);
      const failed = await database()('messages').where({ trial_id: shop.trialId, state: 'failed' });
      expect(failed).toEqual([]);
    });
  }
});

describe('a text that will not arrive', () => {
  it('is known as undelivered, with the reason, and the run stays open', async () => {
    const shop = await startTrial(crew);
    await passTime(10 * minute);
    await crew.desk.setFaults({ undeliverNext: { count: 1, errorCode: 30_003 } });
    await textIn('41.5');
    await live(2, 1_000);
    await expectGoneOn(shop, 1);
    const [failed] = await database()('messages').where({ trial_id: shop.trialId, state: 'failed' });
    expect(failed).toMatchObject({ template: 'runPrompt', error_code: '30003' });
  });

  it('tells of an opt-out that we never heard of, and nothing more goes to that phone', async () => {
    await startTrial(crew);
    await passTime(10 * minute);
    await crew.desk.setFaults({ optOutNext: { count: 1 } });
    await textIn('41.5');
    await live(2, 1_000);
    expect(await database()('people').where({ id: crew.ana }).first('consent')).toEqual({
      consent: 'opted out',
    });
    const before = (await received(crew)).length;
    await live(2, 60 * minute);
    expect(await received(crew)).toHaveLength(before);
  });
});
