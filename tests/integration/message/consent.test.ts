import { describe, expect, it, vi } from 'vitest';
import { forgetConsentOfOldNumber } from '../../../src/features/message/consent.service.ts';
import { database } from '../../../src/server/db/connection.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import { buildPerson } from '../../builders/shop.ts';
import { ask, message, openCrew, personNow, queueCheck, received, textIn } from './crew.ts';

const crew = openCrew();

async function activityKinds(): Promise<string[]> {
  return database()('activity').where({ shop_id: crew.shop.shopId }).orderBy('seq').pluck('kind');
}

describe('consent', () => {
  it('goes from the question over OK to practice, and back by signed webhooks', async () => {
    await ask(crew);
    expect(await received(crew)).toEqual([
      expect.stringMatching(/^Harrow Lane Foods: Dana asks if we may text you/),
    ]);
    await textIn(crew, 'Okay');
    expect(await personNow(crew)).toMatchObject({
      consent: 'agreed',
      consent_wording: 1,
      consent_how: 'text',
    });
    await textIn(crew, '41,5');
    expect(await received(crew)).toEqual([
      expect.stringContaining('Text OK to say yes'),
      expect.stringMatching(/^Thanks\. Try one/),
      expect.stringMatching(/^Got it: 41,5\./),
    ]);
    await vi.waitFor(async () => {
      const rows = await database()('messages').where({ shop_id: crew.shop.shopId });
      expect(rows.map(({ state, segments }) => [state, segments])).toEqual(Array(3).fill(['delivered', 1]));
    });
    expect(await activityKinds()).toEqual(['consent.asked', 'consent.given']);
    expect(crew.desk.answers.every(({ status }) => status === 200)).toBe(true);
  });

  it('is not silence, not no, and nothing that was not asked', async () => {
    await textIn(crew, 'OK');
    expect(await personNow(crew)).toMatchObject({ consent: 'unasked' });
    await ask(crew);
    await textIn(crew, 'who is this');
    await textIn(crew, 'no');
    expect(await personNow(crew)).toMatchObject({ consent: 'asked' });
    await queueCheck(crew, 'a');
    await queueCheck(crew, 'b', { urgent: true });
    await crew.desk.work();
    expect(await received(crew)).toHaveLength(1);
    for (const dedupe of ['a', 'b']) {
      expect(await message(crew, dedupe)).toMatchObject({ state: 'failed', error_code: 'no-consent' });
    }
    expect(await activityKinds()).toEqual(['consent.asked', 'consent.declined']);
  });

  it('is asked once a day', async () => {
    await ask(crew);
    await ask(crew);
    expect(await received(crew)).toHaveLength(1);
  });
});

describe('a changed number', () => {
  it('gets nothing until it says OK itself', async () => {
    await ask(crew);
    await textIn(crew, 'OK');
    const newPhone = crew.phone.replace('+12025554', '+12025557');
    await inTransaction(crew.shop, async (inside) => {
      await queueCheck({ ...crew, shop: inside }, 'for the old number');
      await inside.db('people').where({ id: crew.ana }).update({ phone: newPhone });
      await forgetConsentOfOldNumber(inside, crew.ana);
    });
    await queueCheck(crew, 'for the new number');
    await crew.desk.work();
    expect(await received(crew, newPhone)).toEqual([]);
    await ask(crew);
    expect(await received(crew, newPhone)).toHaveLength(1);
    await textIn(crew, 'OK', crew.phone);
    expect(await personNow(crew)).toMatchObject({ consent: 'asked' });
    await textIn(crew, 'OK', newPhone);
    expect(await personNow(crew)).toMatchObject({ consent: 'agreed' });
    expect((await received(crew)).filter((body) => body.includes('Check'))).toEqual([]);
  });

  it('is noticed even where nobody told us', async () => {
    await ask(crew);
    await textIn(crew, 'OK');
    await queueCheck(crew, 'late');
    await database()('people')
      .where({ id: crew.ana })
      .update({ phone: crew.phone.replace('+12025554', '+12025558') });
    await crew.desk.work();
    expect(await message(crew, 'late')).toMatchObject({ state: 'failed', error_code: 'address-changed' });
  });
});

describe('an unknown sender', () => {
  it('is kept, never answered, and its STOP holds for the number', async () => {
    const stranger = crew.phone.replace('+12025554', '+12025559');
    await textIn(crew, 'hello?', stranger);
    await textIn(crew, 'STOP', stranger);
    const kept = await database()('inbox_texts').where({ shop_id: crew.shop.shopId, from_phone: stranger });
    expect(kept.map(({ body, state }) => [body, state])).toEqual([
      ['hello?', 'set aside'],
      ['STOP', 'set aside'],
    ]);
    expect(await received(crew, stranger)).toEqual([]);
    const eva = await buildPerson(crew.shop, ['operator'], { phone: stranger });
    await expect(ask(crew, eva)).rejects.toMatchObject({ code: 'not-now' });
  });
});
