import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { setTimeout as wait } from 'node:timers/promises';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, expect, it, vi } from 'vitest';
import { queueMessage } from '../../../src/features/message/message.service.ts';
import { settleUnsureTexts } from '../../../src/features/message/settling.service.ts';
import { database } from '../../../src/server/db/connection.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';
import { moveClock } from '../../setup/own-database.ts';
import { openTextDesk, type TextDesk } from './text-desk.ts';

const script = fileURLToPath(new URL('send-in-process.ts', import.meta.url));

let desk: TextDesk;
beforeAll(async () => {
  desk = await openTextDesk();
});
afterAll(() => desk.close());

function startWorker(textsPerSecond: number): { child: ChildProcess; ended: Promise<string> } {
  const child = spawn(process.execPath, ['--import', 'tsx', script], {
    env: { ...process.env, TWILIO_API_URL: desk.textsUrl, TEXTS_PER_SECOND: String(textsPerSecond) },
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  let output = '';
  child.stdout?.on('data', (chunk: Buffer) => {
    output += chunk.toString();
  });
  return { child, ended: once(child, 'close').then(() => output) };
}

async function queueTexts(shop: ShopScope, count: number, phone: string): Promise<void> {
  const personId = await buildPerson(shop, ['operator'], { phone, consent: 'agreed' });
  await inTransaction(shop, async (inside) => {
    for (let n = 0; n < count; n += 1) {
      const params = { shop: `Text ${n}` };
      await queueMessage(inside, { template: 'textsCheck', params, personId, dedupe: `text:${n}` });
    }
  });
}

async function bodiesAt(phone: string): Promise<string[]> {
  return (await desk.texts()).filter(({ to }) => to === phone).map(({ body }) => body);
}

it('sends 500 texts from two workers, each exactly once', { timeout: 180_000 }, async () => {
  const shop = await buildShop();
  const phone = '+12025558001';
  await queueTexts(shop, 500, phone);
  const workers = [startWorker(1000), startWorker(1000)];
  const outputs = await Promise.all(workers.map(({ ended }) => ended));
  // Both had a part in it, or the test would prove nothing.
  const rounds = outputs.map((output) => Number(/DONE (\d+)/.exec(output)?.[1]));
  for (const count of rounds) expect(count).toBeGreaterThan(20);

  const bodies = await bodiesAt(phone);
  expect(bodies).toHaveLength(500);
  expect(new Set(bodies).size).toBe(500);
  const rows = await database()('messages')
    .where({ shop_id: shop.shopId })
    .select('state', 'attempts', 'provider_id');
  expect(rows.every(({ state }) => ['sent', 'delivered'].includes(state))).toBe(true);
  expect(rows.every(({ attempts }) => attempts === 1)).toBe(true);
  expect(new Set(rows.map(({ provider_id }) => provider_id)).size).toBe(500);
});

it('keeps the pace of a number over two workers', { timeout: 60_000 }, async () => {
  const shop = await buildShop();
  const phone = '+12025558002';
  await queueTexts(shop, 12, phone);
  await Promise.all([startWorker(5), startWorker(5)].map(({ ended }) => ended));
  const sentAt = (await desk.texts()).filter(({ to }) => to === phone).map(({ createdAt }) => createdAt);
  expect(sentAt).toHaveLength(12);
  // Eleven pauses of a fifth of a second; the way to the service may shorten the first and lengthen the last a little.
  expect(Math.max(...sentAt) - Math.min(...sentAt)).toBeGreaterThan(11 * 200 - 150);
});

it('settles a text whose worker was killed between send and record, without a second send', {
  timeout: 60_000,
}, async () => {
  const shop = await buildShop();
  const phone = '+12025558003';
  await queueTexts(shop, 1, phone);
  await desk.setFaults({ swallowNextAnswers: 1, webhooks: 'off' });
  const { child, ended } = startWorker(1000);
  await vi.waitFor(async () => expect(await bodiesAt(phone)).toHaveLength(1), {
    timeout: 20_000,
    interval: 20,
  });
  child.kill('SIGKILL');
  await ended;
  const stateNow = async () =>
    (await database()('messages').where({ shop_id: shop.shopId }).first('state')).state;
  expect(await stateNow()).toBe('sending');

  // Within the lease nobody touches it.
  await desk.work();
  expect(await stateNow()).toBe('sending');
  moveClock(61_000);
  await wait(250);
  await desk.work();
  expect(await stateNow()).toBe('unsure');
  expect(await settleUnsureTexts(database(), desk.gateway)).toBe(1);
  expect(await stateNow()).toBe('delivered');
  moveClock(4_000_000);
  await wait(250);
  await desk.work();
  expect(await bodiesAt(phone)).toHaveLength(1);
});
