import { afterEach, describe, expect, it } from 'vitest';
import { now } from '../../../src/server/clock.ts';
import { database } from '../../../src/server/db/connection.ts';
import { sendTexts } from '../../../src/worker/send-messages.ts';
import { buildPerson } from '../../builders/shop.ts';
import { message, openCrew, passTime, queueCheck, received } from './crew.ts';
import { runUntilIdle } from './text-desk.ts';

const crew = openCrew({ consent: 'agreed' });
afterEach(() => crew.desk.setFaults({ failNextSends: { count: 0, status: 500 }, webhooks: 'on' }));

describe('sending', () => {
  it('puts urgent texts first, and leaves each out of its hours to wait', async () => {
    const late = await buildPerson(crew.shop, ['operator'], {
      phone: '+12025559001',
      consent: 'agreed',
      work_hours: JSON.stringify({ v: 1, spans: [] }),
    });
    await queueCheck(crew, 'first');
    await queueCheck(crew, 'second');
    await queueCheck(crew, 'danger', { urgent: true });
    await queueCheck(crew, 'never', { personId: late });
    await queueCheck(crew, 'danger for all', { personId: late, urgent: true });
    await crew.desk.work();
    expect((await received(crew)).map((body) => /Check ([a-z]+)/.exec(body)?.[1])).toEqual([
      'danger',
      'first',
      'second',
    ]);
    expect(await received(crew, '+12025559001')).toHaveLength(1);
    expect(await message(crew, 'never')).toMatchObject({ state: 'failed', error_code: 'no-hours' });
  });

  it('comes back after 429 as late as the service asks, and after 500 by its own plan', async () => {
    await crew.desk.setFaults({ failNextSends: { count: 1, status: 429, retryAfterSeconds: 90 } });
    await queueCheck(crew, 'busy');
    await crew.desk.work();
    const waiting = await message(crew, 'busy');
    expect(waiting).toMatchObject({ state: 'waiting', attempts: 1, error_code: '429' });
    expect(waiting.not_before - now()).toBeGreaterThan(85_000);
    expect(waiting.not_before - now()).toBeLessThanOrEqual(90_000);
    await crew.desk.setFaults({ failNextSends: { count: 1, status: 500 } });
    await passTime(91_000);
    await crew.desk.work();
    const again = await message(crew, 'busy');
    expect(again).toMatchObject({ state: 'waiting', attempts: 2 });
    // 15 s, a fifth more or less.
    expect(again.not_before - now()).toBeGreaterThan(10_000);
    expect(again.not_before - now()).toBeLessThanOrEqual(18_000);
    await passTime(18_000);
    await crew.desk.work();
    expect(await message(crew, 'busy')).toMatchObject({ state: 'sent', attempts: 3 });
    expect(await received(crew)).toHaveLength(1);
  });

  it('gives up after eight attempts', async () => {
    await crew.desk.setFaults({ failNextSends: { count: 100, status: 503 } });
    await queueCheck(crew, 'hopeless');
    for (let attempt = 1; attempt <= 8; attempt += 1) {
      await crew.desk.work();
      await passTime(4_400_000);
    }
    await crew.desk.work();
    expect(await message(crew, 'hopeless')).toMatchObject({
      state: 'failed',
      attempts: 8,
      error_code: 'attempts',
    });
  });

  it('stops at once where the service will never take it', async () => {
    await database()('people').where({ id: crew.ana }).update({ phone: '+1' });
    await queueCheck(crew, 'bad number');
    await crew.desk.work();
    expect(await message(crew, 'bad number')).toMatchObject({
      state: 'failed',
      attempts: 1,
      error_code: '21211',
    });
  });

  it('keeps to the pace of the number', async () => {
    for (const dedupe of ['a', 'b', 'c', 'd', 'e']) await queueCheck(crew, dedupe);
    const began = Date.now();
    await runUntilIdle([
      sendTexts(
        () => crew.desk.gateway,
        () => 10,
      ),
    ]);
    expect(await received(crew)).toHaveLength(5);
    // Five texts have four pauses of a tenth of a second between them.
    expect(Date.now() - began).toBeGreaterThanOrEqual(400);
  });

  it('does not let a text of an unknown kind hold up the others', async () => {
    await queueCheck(crew, 'odd');
    await database()('messages')
      .where({ shop_id: crew.shop.shopId, dedupe: 'odd' })
      .update({ template: 'gone' });
    await queueCheck(crew, 'fine');
    await crew.desk.work();
    expect(await message(crew, 'odd')).toMatchObject({ state: 'failed', error_code: 'unknown-template' });
    expect(await message(crew, 'fine')).toMatchObject({ state: 'sent' });
  });
});
