import { describe, expect, it } from 'vitest';
import { queueMessage } from '../../../src/features/message/message.service.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';
import { message, openCrew, queueCheck } from './crew.ts';

const crew = openCrew({ consent: 'agreed' });

describe('queueing', () => {
  it('is part of the change that causes it', async () => {
    const failing = inTransaction(crew.shop, async (inside) => {
      await queueMessage(inside, {
        template: 'textsCheck',
        params: { shop: 'x' },
        personId: crew.ana,
        dedupe: 'gone',
      });
      throw new Error('the change failed');
    });
    await expect(failing).rejects.toThrow('the change failed');
    expect(await message(crew, 'gone')).toBeUndefined();
    const outside = queueMessage(crew.shop, {
      template: 'textsCheck',
      params: { shop: 'x' },
      personId: crew.ana,
      dedupe: 'd',
    });
    await expect(outside).rejects.toThrow(RangeError);
  });

  it('writes one message for one purpose', async () => {
    expect(await queueCheck(crew, 'same')).toMatchObject({ queued: true });
    expect(await queueCheck(crew, 'same')).toEqual({ queued: false, reason: 'already' });
  });

  it('needs a person of the shop, and an address', async () => {
    const noPhone = await buildPerson(crew.shop, ['operator'], { phone: null });
    expect(await queueCheck(crew, 'n', { personId: noPhone })).toEqual({
      queued: false,
      reason: 'no-address',
    });
    const elsewhere = await buildPerson(await buildShop(), ['operator'], { phone: crew.phone });
    await expect(queueCheck(crew, 'f', { personId: elsewhere })).rejects.toMatchObject({ code: 'not-found' });
  });

  it("writes in the person's language, in plain letters unless they want marks", async () => {
    const minh = await buildPerson(crew.shop, ['operator'], {
      phone: '+84912345678',
      language: 'vi',
      plain_letters: false,
    });
    await queueCheck(crew, 'vi', { personId: minh });
    expect(await message(crew, 'vi')).toMatchObject({ body: expect.stringContaining('tin nhắn tới được') });
    const ola = await buildPerson(crew.shop, ['operator'], { phone: '+48601234567', language: 'pl' });
    await queueCheck(crew, 'pl', { personId: ola });
    expect(await message(crew, 'pl')).toMatchObject({
      body: expect.stringContaining('SMS-y dochodza'),
      segments: 1,
    });
  });
});
