import { beforeEach, describe, expect, it } from 'vitest';
import { forgetTextsOfPerson } from '../../../src/features/message/retention.service.ts';
import { database } from '../../../src/server/db/connection.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import { buildPerson } from '../../builders/shop.ts';
import { ask, message, openCrew, personNow, queueCheck, received, textIn } from './crew.ts';

const crew = openCrew();

beforeEach(async () => {
  await ask(crew);
  await textIn(crew, 'OK');
});

async function sendCheck(dedupe: string, change = {}) {
  await queueCheck(crew, dedupe, change);
  await crew.desk.work();
  return message(crew, dedupe);
}

describe('STOP', () => {
  it('ends texts at once, also those that wait, and START only lets us ask again', async () => {
    await queueCheck(crew, 'later', { notBefore: Date.now() + 3_600_000 });
    await textIn(crew, 'stop.');
    expect(await personNow(crew)).toMatchObject({ consent: 'opted out' });
    expect(await message(crew, 'later')).toMatchObject({ state: 'cancelled' });
    const before = await received(crew);
    expect(await sendCheck('danger', { urgent: true })).toMatchObject({
      state: 'failed',
      error_code: 'opted-out',
    });
    await expect(ask(crew)).rejects.toMatchObject({ code: 'not-now' });

    await textIn(crew, 'START');
    expect((await received(crew)).slice(before.length)).toEqual([
      expect.stringContaining('Dana asks if we may text you'),
    ]);
    expect(await sendCheck('still nothing')).toMatchObject({ state: 'failed', error_code: 'no-consent' });
    expect(await received(crew)).toHaveLength(before.length + 1);
    await textIn(crew, 'OK');
    await sendCheck('now');
    expect((await received(crew)).at(-1)).toContain('Check now');
    const kinds = await database()('activity').where({ shop_id: crew.shop.shopId }).pluck('kind');
    expect(kinds).toContain('consent.withdrawn');
  });

  it('is learnt from the service where its webhook never came', async () => {
    await crew.desk.setFaults({ webhooks: 'off' });
    await crew.desk.textFromPhone({ from: crew.phone, to: crew.number, body: 'STOP' });
    await crew.desk.setFaults({ webhooks: 'on' });
    expect(await sendCheck('refused')).toMatchObject({ state: 'failed', error_code: '21610' });
    expect(await personNow(crew)).toMatchObject({ consent: 'opted out', consent_how: 'service' });
  });
});

describe('an erased person who had opted out', () => {
  it('leaves the opt-out with the number: whoever has it next is not even asked', async () => {
    await textIn(crew, 'STOP');
    await inTransaction(crew.shop, async (inside) => {
      await forgetTextsOfPerson(inside, crew.ana);
      const erased = { phone: null, active: false, erased_at: Date.now() };
      await inside.db('people').where({ id: crew.ana }).update(erased);
    });
    const words = await database()('messages').where({ person_id: crew.ana }).pluck('body');
    const texts = await database()('inbox_texts').where({ person_id: crew.ana }).pluck('body');
    expect([...words, ...texts].join('')).toBe('');

    const eva = await buildPerson(crew.shop, ['operator'], { phone: crew.phone });
    const before = await received(crew);
    await expect(ask(crew, eva)).rejects.toMatchObject({ code: 'not-now' });
    const people = database()('people').where({ id: eva });
    await people.clone().update({ consent: 'agreed' });
    expect(await sendCheck('sneaky', { personId: eva })).toMatchObject({
      state: 'failed',
      error_code: 'opted-out',
    });
    await people.clone().update({ consent: 'unasked' });
    await textIn(crew, 'OK');
    await expect(ask(crew, eva)).rejects.toMatchObject({ code: 'not-now' });
    // Only the holder of the number lets the question through again.
    await textIn(crew, 'START');
    expect(await received(crew)).toEqual(before);
    await ask(crew, eva);
    expect(await received(crew)).toHaveLength(before.length + 1);
  });
});
