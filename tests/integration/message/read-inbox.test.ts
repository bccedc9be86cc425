import { beforeEach, describe, expect, it } from 'vitest';
import { keepReceivedText } from '../../../src/features/message/inbox.service.ts';
import { now } from '../../../src/server/clock.ts';
import { database } from '../../../src/server/db/connection.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { newId } from '../../../src/server/ids.ts';
import { readInbox } from '../../../src/worker/read-inbox.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';

let shop: ShopScope;
let ana: string;
let eva: string;

beforeEach(async () => {
  shop = await buildShop();
  ana = await buildPerson(shop, ['operator'], { phone: '+12025552001', consent: 'asked' });
  eva = await buildPerson(shop, ['operator'], { phone: '+12025552002', consent: 'asked' });
});

async function textFrom(from: string, body: string, sentAt: number): Promise<void> {
  const media = { items: [], unlisted: 0 };
  await keepReceivedText(shop, { providerId: newId(), from, body, media, sentAt });
}

function read(workerId = 'worker one'): Promise<number> {
  return readInbox.run({ db: database(), workerId, stopping: () => false });
}

async function consentOf(id: string): Promise<string> {
  return (await database()('people').where({ id }).first('consent')).consent;
}

async function inbox() {
  return database()('inbox_texts')
    .where({ shop_id: shop.shopId })
    .orderBy('sent_at')
    .select('body', 'state', 'attempts');
}

describe('reading texts', () => {
  it('goes by the order the service had them, not by the order they reached us', async () => {
    await textFrom('+12025552001', 'STOP', now());
    await textFrom('+12025552001', 'OK', now() - 60_000);
    await read();
    expect(await consentOf(ana)).toBe('opted out');
  });

  it("holds a person's later texts back after one that failed, lets others pass, and sets it aside in the end", async () => {
    await textFrom('+12025552001', 'OK', now() - 2000);
    await textFrom('+12025552001', 'STOP', now() - 1000);
    await textFrom('+12025552002', 'OK', now());
    // Hours that cannot be read stop anything that looks at the person.
    await database()('people').where({ id: ana }).update({ work_hours: 'broken' });
    await read();
    expect(await consentOf(eva)).toBe('agreed');
    expect(await inbox()).toEqual([
      { body: 'OK', state: 'new', attempts: 1 },
      { body: 'STOP', state: 'new', attempts: 0 },
      { body: 'OK', state: 'read', attempts: 0 },
    ]);
    for (let attempt = 2; attempt <= 5; attempt += 1) await read();
    expect((await inbox())[0]).toEqual({ body: 'OK', state: 'set aside', attempts: 5 });
    await database()('people').where({ id: ana }).update({ work_hours: '{"v":1,"spans":[]}' });
    await read();
    expect(await consentOf(ana)).toBe('opted out');
  });

  it('is the work of one worker at a time', async () => {
    await textFrom('+12025552001', 'OK', now());
    await read('worker one');
    await textFrom('+12025552002', 'OK', now());
    expect(await read('worker two')).toBe(0);
    expect(await consentOf(eva)).toBe('asked');
    expect(await read('worker one')).toBe(1);
  });
});
