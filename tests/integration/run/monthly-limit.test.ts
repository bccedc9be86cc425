import { expect, it } from 'vitest';
import { standingOf } from '../../../src/features/message/monthly-texts.ts';
import { readBoard } from '../../../src/features/run/read-board.service.ts';
import { database } from '../../../src/server/db/connection.ts';
import { openCrew, passTime, received } from '../message/crew.ts';
import { lastText, phoneOf, type RunningShop, reply, startTrial, statesOf, work } from './text-fixture.ts';

const minute = 60_000;
const crew = openCrew();

const textsOf = async (shop: RunningShop) => (await readBoard(shop.scope, shop.trialId, shop.dana)).texts;

async function setLimit(limit: number | null): Promise<void> {
  await database()('shops').where({ id: crew.shop.shopId }).update({ monthly_text_limit: limit });
}

it('is near from four fifths on, and reached when all are used', () => {
  expect([79, 80, 99, 100, 101].map((used) => standingOf(used, 100))).toEqual([
    'enough',
    'low',
    'low',
    'used up',
    'used up',
  ]);
});

it('counts texts and parts of a trial, warns, then leaves runs to the board and paper; safety texts go', async () => {
  const shop = await startTrial(crew);
  await passTime(10 * minute);
  await reply(shop, '41.5');
  // As if the first had been a long one, so that four fifths can be told from all.
  const [first] = await database()('messages').where({ trial_id: shop.trialId }).orderBy('id');
  await database()('messages').where({ id: first.id }).update({ segments: 40 });
  const { sent, parts, month } = await textsOf(shop);
  const rows = await database()('messages').where({ trial_id: shop.trialId }).whereNotNull('provider_id');
  expect(sent).toBe(rows.length);
  expect(parts).toBe(rows.reduce((sum, { segments }) => sum + segments, 0));
  expect(month).toBeNull();

  await setLimit(Math.floor(parts / 0.8));
  expect((await textsOf(shop)).month).toMatchObject({ used: parts, standing: 'low' });
  await setLimit(parts);
  expect((await textsOf(shop)).month?.standing).toBe('used up');
  await passTime(10 * minute);
  await reply(shop, '40.8');
  expect(await lastText(shop)).toMatch(/^Run 2 saved: 40\.8\./);
  expect(await statesOf(shop)).toEqual(['done', 'done', ...Array(9).fill('waiting')]);
  const before = (await received(crew)).length;
  await passTime(120 * minute);
  await work(crew);
  expect(await received(crew)).toHaveLength(before);

  await reply(shop, 'DANGER');
  expect(await lastText(shop, await phoneOf(shop.dana.personId))).toMatch(/^STOPPED/);
});

it('sends runs again once the limit is raised', async () => {
  const shop = await startTrial(crew);
  await setLimit(1);
  await passTime(10 * minute);
  await reply(shop, '41.5');
  await passTime(minute);
  await work(crew);
  expect((await statesOf(shop))[1]).toBe('waiting');
  await setLimit(1_000);
  await passTime(minute);
  await work(crew);
  expect((await statesOf(shop))[1]).toBe('asked');
});
