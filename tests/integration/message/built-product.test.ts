import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { Knex } from 'knex';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { demoNumber, demoPhones } from '../../../src/commands/start/demo-phones.mjs';
import { askForConsent } from '../../../src/features/message/consent.service.ts';
import { queueMailTo } from '../../../src/features/message/message.service.ts';
import { openDatabase } from '../../../src/server/db/connection.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { type ChildProgram, startProgram } from '../../setup/child-program.ts';
import { findFreePort } from '../../setup/free-port.ts';
import { type StandIns, startStandIns, testAccount } from '../stand-ins.ts';

const main = fileURLToPath(new URL('../../../dist/main/main.mjs', import.meta.url));
// Minh of the demo shop, whom nobody has asked yet.
const phone = '+12025550168';

let folder: string;
let port: number;
let url: string;
let standIns: StandIns;
let app: ChildProgram;
let db: Knex;
let shop: ShopScope;
let minh: string;

function startProduct(): Promise<ChildProgram> {
  return startProgram(main, {
    APP_URL: url,
    PORT: String(port),
    DATA_DIR: folder,
    TWILIO_ACCOUNT_SID: testAccount.accountSid,
    TWILIO_AUTH_TOKEN: testAccount.authToken,
    TWILIO_API_URL: standIns.textsUrl,
    SMTP_PORT: String(standIns.smtpPort),
    TEXTS_PER_SECOND: '100',
  });
}

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'trywell-built-'));
  port = await findFreePort();
  url = `http://127.0.0.1:${port}`;
  standIns = await startStandIns(url, testAccount);
  app = await startProduct();
  db = openDatabase({ kind: 'sqlite', file: join(folder, 'trywell.sqlite') });
  const { id, shop_id } = await db('people').where({ phone }).first('id', 'shop_id');
  minh = id;
  shop = { db, shopId: shop_id, actor: { kind: 'command', id: null } };
  const round = { v: 1, spans: [{ days: [1, 2, 3, 4, 5, 6, 7], fromMinute: 0, toMinute: 0 }] };
  await db('people')
    .where({ id: minh })
    .update({ language: 'en', work_hours: JSON.stringify(round) });
}, 60_000);

afterAll(async () => {
  await db.destroy();
  await app.stop();
  await standIns.stop();
  rmSync(folder, { recursive: true, force: true });
});

const soon = { timeout: 15_000, interval: 100 };

async function received(): Promise<string[]> {
  const texts = await standIns.texts();
  return texts
    .filter(({ direction, to }) => direction === 'outbound-api' && to === phone)
    .map(({ body }) => body);
}

async function inbound() {
  const told = (await standIns.deliveries()).filter(({ kind }) => kind === 'inbound');
  return told.map(({ parameters, outcome, httpStatus }) => ({ parameters, outcome, httpStatus }));
}

describe('the built product with its worker', { timeout: 90_000 }, () => {
  it('has the very phones that the demo shows', async () => {
    const people = await db('people').whereNotNull('phone').orderBy('phone').select('phone', 'name');
    expect(Object.fromEntries(people.map(({ phone: own, name }) => [own, name]))).toEqual(demoPhones);
    expect(await db('shops').pluck('text_number')).toEqual([demoNumber]);
  });

  it('sends a text and a mail, and hears by signed webhooks what became of it and what is answered', async () => {
    await askForConsent(shop, minh, { id: minh, name: 'Dana' });
    await expect.poll(received, soon).toEqual([expect.stringContaining('Dana asks if we may text you')]);
    await expect
      .poll(() => db('messages').where({ template: 'consent' }).pluck('state'), soon)
      .toEqual(['delivered']);

    await standIns.textFromPhone({ from: phone, to: demoNumber, body: 'OK' });
    await expect.poll(async () => (await received()).length, soon).toBe(2);
    await standIns.textFromPhone({ from: phone, to: demoNumber, body: '41.5' });
    await expect.poll(async () => (await received()).at(-1), soon).toContain('Got it: 41.5.');

    const params = { name: 'Dana', shop: 'Harrow Lane Foods' };
    await inTransaction(shop, (inside) =>
      queueMailTo(inside, {
        template: 'emailChanged',
        params,
        address: 'before@harrowlane.example',
        language: 'en',
        dedupe: 'built:mail',
      }),
    );
    await expect
      .poll(async () => (await standIns.mails()).map(({ recipients }) => recipients[0]), soon)
      .toEqual(['before@harrowlane.example']);
  });

  it('answers an empty 200 to the service, 403 to anybody else, and 200 without effect to a replay', async () => {
    const [first] = await inbound();
    expect(first).toMatchObject({ outcome: 'taken', httpStatus: 200 });
    const form = new URLSearchParams(first?.parameters);
    const call = (signature: string, body: URLSearchParams) =>
      fetch(`${url}/api/texts/inbound`, {
        method: 'POST',
        body,
        headers: { 'x-twilio-signature': signature },
      });
    const before = await db('inbox_texts').orderBy('id');

    const number = (await standIns.deliveries()).find(({ kind }) => kind === 'inbound')?.number;
    await fetch(`${standIns.textsUrl}/fake/deliveries/${number}/again`, { method: 'POST' });
    await expect
      .poll(async () => (await inbound())[0], soon)
      .toMatchObject({ outcome: 'taken', httpStatus: 200 });

    const forged = await call('c29tZXRoaW5nIGVsc2U=', form);
    expect(forged.status).toBe(403);
    expect(await forged.json()).toMatchObject({ code: 'bad-signature' });
    const status = await fetch(`${url}/api/texts/status?m=${minh}`, { method: 'POST', body: form });
    expect(status.status).toBe(403);
    expect(await db('inbox_texts').orderBy('id')).toEqual(before);
    expect(await received()).toHaveLength(3);
  });

  it('catches up with what was texted while it was down', async () => {
    expect(await app.stop()).toBe(0);
    await standIns.textFromPhone({ from: phone, to: demoNumber, body: 'STOP' });
    await expect.poll(async () => (await inbound()).at(-1)?.outcome, soon).toBe('missed');
    app = await startProduct();
    await expect.poll(() => db('people').where({ id: minh }).pluck('consent'), soon).toEqual(['opted out']);
  });
});
