import { beforeEach, describe, expect, it } from 'vitest';
import { keepReceivedText } from '../../../src/features/message/inbox.service.ts';
import { queueMessage } from '../../../src/features/message/message.service.ts';
import { forgetOldWords } from '../../../src/features/message/retention.service.ts';
import { now } from '../../../src/server/clock.ts';
import { database } from '../../../src/server/db/connection.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';
import { queueCheck } from './crew.ts';

const day = 24 * 3_600_000;
const media = { items: [], unlisted: 0 };

let shop: ShopScope;
let ana: string;
let phone: string;
let phones = 0;

beforeEach(async () => {
  shop = await buildShop({ keep_texts_days: 40 });
  phones += 1;
  phone = `+1202555${String(3000 + phones)}`;
  ana = await buildPerson(shop, ['operator'], { phone });
});

async function trial(state: string, closedDaysAgo: number): Promise<string> {
  const id = newId();
  const at = now() - closedDaysAgo * day;
  await database()('trials').insert({
    id,
    shop_id: shop.shopId,
    number: closedDaysAgo + (state === 'closed' ? 0 : 1000),
    title: 'Seals',
    title_search: 'seals',
    machine: 'Line 3',
    machine_search: 'line 3',
    owner_id: ana,
    state,
    created_at: at,
    updated_at: at,
  });
  return id;
}

async function message(about: { trialId?: string; daysAgo: number; state?: string }): Promise<string> {
  const dedupe = newId();
  const { trialId, daysAgo, state = 'delivered' } = about;
  await queueCheck({ shop, ana }, dedupe, trialId === undefined ? {} : { trialId });
  const written = { state, created_at: now() - daysAgo * day };
  await database()('messages').where({ dedupe }).update(written);
  return dedupe;
}

async function textFrom(from: string, daysAgo: number): Promise<string> {
  const providerId = newId();
  await keepReceivedText(shop, { providerId, from, body: 'words', media, sentAt: now() });
  const received = { received_at: now() - daysAgo * day, state: 'read' };
  await database()('inbox_texts').where({ provider_id: providerId }).update(received);
  return providerId;
}

async function bodiesOf(dedupes: string[]): Promise<boolean[]> {
  const rows = await database()('messages')
    .whereIn('dedupe', dedupes)
    .select('dedupe', 'body', 'params', 'recipient');
  return dedupes.map((dedupe) => {
    const row = rows.find((one) => one.dedupe === dedupe);
    const isWhole = row.body !== '' && row.recipient === phone && row.params.includes('Check');
    const isBlank = row.body === '' && row.recipient === '' && !row.params.includes('Check');
    if (isWhole === isBlank) throw new Error('half of the words are left');
    return isWhole;
  });
}

describe('letting go of words', () => {
  it('counts the days of the shop from the close of the trial, or from the writing where there is none', async () => {
    const kept = [
      await message({ daysAgo: 39 }),
      await message({ daysAgo: 400, trialId: await trial('running', 400) }),
      await message({ daysAgo: 400, trialId: await trial('closed', 39) }),
      await message({ daysAgo: 400, state: 'waiting' }),
    ];
    const gone = [
      await message({ daysAgo: 41 }),
      await message({ daysAgo: 41, state: 'failed' }),
      await message({ daysAgo: 400, trialId: await trial('closed', 41) }),
    ];
    expect(await forgetOldWords(database())).toBe(3);
    expect(await bodiesOf(kept)).toEqual([true, true, true, true]);
    expect(await bodiesOf(gone)).toEqual([false, false, false]);
    expect(await forgetOldWords(database())).toBe(0);
  });

  it('blanks what people wrote and removes what strangers wrote', async () => {
    const own = [await textFrom(phone, 39), await textFrom(phone, 41)];
    const strange = [await textFrom('+12025551999', 29), await textFrom('+12025551999', 31)];
    await forgetOldWords(database());
    const rows = await database()('inbox_texts')
      .where({ shop_id: shop.shopId })
      .select('provider_id', 'body');
    const bodyOf = (id: string | undefined) => rows.find(({ provider_id }) => provider_id === id)?.body;
    expect(own.map(bodyOf)).toEqual(['words', '']);
    expect(strange.map(bodyOf)).toEqual(['words', undefined]);
  });

  it('leaves other shops alone', async () => {
    const other = await buildShop({ keep_texts_days: 1000 });
    const person = await buildPerson(other, ['operator'], { phone });
    await inTransaction(other, (inside) =>
      queueMessage(inside, { template: 'practice', params: {}, personId: person, dedupe: 'other' }),
    );
    const mine = database()('messages').where({ shop_id: other.shopId });
    await mine.clone().update({ state: 'delivered', created_at: now() - 500 * day });
    await forgetOldWords(database());
    expect((await mine.clone().first('body')).body).not.toBe('');
  });
});
