import { type AddressInfo, createServer } from 'node:net';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { settleUnsureTexts } from '../../../src/features/message/settling.service.ts';
import { createTwilioGateway } from '../../../src/features/message/twilio-gateway.ts';
import { now } from '../../../src/server/clock.ts';
import { database } from '../../../src/server/db/connection.ts';
import { config } from '../../../src/server/env.ts';
import { sendTexts } from '../../../src/worker/send-messages.ts';
import { message, openCrew, passTime, queueCheck, received } from './crew.ts';
import { runUntilIdle } from './text-desk.ts';

const crew = openCrew({ consent: 'agreed' });
afterEach(() => crew.desk.setFaults({ failNextSends: { count: 0, status: 500 }, webhooks: 'on' }));

describe('a text whose answer was lost', () => {
  const settle = () => settleUnsureTexts(database(), crew.desk.gateway);

  it('is settled by the list, without a second send', async () => {
    await crew.desk.setFaults({ swallowNextAnswers: 1, webhooks: 'off' });
    await queueCheck(crew, 'lost');
    await crew.desk.work();
    expect(await message(crew, 'lost')).toMatchObject({ state: 'unsure', attempts: 1, provider_id: null });
    expect(await settle()).toBe(1);
    const [text] = (await crew.desk.texts()).filter(({ to }) => to === crew.phone);
    expect(await message(crew, 'lost')).toMatchObject({ state: 'delivered', provider_id: text?.sid });
    await passTime(120_000);
    await crew.desk.work();
    expect(await received(crew)).toHaveLength(1);
  });

  it('is settled by the webhook, where that is faster', async () => {
    await crew.desk.setFaults({ swallowNextAnswers: 1 });
    await queueCheck(crew, 'lost');
    await crew.desk.work();
    await vi.waitFor(async () => expect(await message(crew, 'lost')).toMatchObject({ state: 'delivered' }));
    expect(await settle()).toBe(0);
    expect(await received(crew)).toHaveLength(1);
  });

  it('goes again when the list has not got it, but not before its lease has run out', async () => {
    const silent = createServer(() => {});
    await new Promise<void>((resolve) => silent.listen(0, '127.0.0.1', resolve));
    const { accountSid, authToken } = config().texts;
    const deaf = createTwilioGateway(
      {
        accountSid,
        authToken,
        apiUrl: `http://127.0.0.1:${(silent.address() as AddressInfo).port}`,
        publicUrl: config().appUrl,
        timeoutMilliseconds: 200,
      },
      now,
    );
    await queueCheck(crew, 'unheard');
    await runUntilIdle([
      sendTexts(
        () => deaf,
        () => 1000,
      ),
    ]);
    silent.close();
    expect(await message(crew, 'unheard')).toMatchObject({ state: 'unsure' });
    expect(await settle()).toBe(0);
    expect(await message(crew, 'unheard')).toMatchObject({ state: 'unsure' });
    await passTime(61_000);
    expect(await settle()).toBe(1);
    expect(await message(crew, 'unheard')).toMatchObject({ state: 'waiting', error_code: 'missing' });
    await passTime(7_000);
    await crew.desk.work();
    expect(await received(crew)).toHaveLength(1);
  });

  it('is not mistaken for an earlier text of the same words', async () => {
    await queueCheck(crew, 'one');
    await crew.desk.work();
    await crew.desk.setFaults({ swallowNextAnswers: 1, webhooks: 'off' });
    await queueCheck(crew, 'two');
    await database()('messages')
      .where({ shop_id: crew.shop.shopId, dedupe: 'two' })
      .update({ body: (await message(crew, 'one')).body });
    await crew.desk.work();
    await settle();
    const [one, two] = [await message(crew, 'one'), await message(crew, 'two')];
    expect(two.state).toBe('delivered');
    expect(two.provider_id).not.toBe(one.provider_id);
  });
});
