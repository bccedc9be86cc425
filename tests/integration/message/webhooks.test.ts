import twilio from 'twilio';
import { describe, expect, it, vi } from 'vitest';
import { catchUpTexts } from '../../../src/features/message/catching-up.service.ts';
import { database } from '../../../src/server/db/connection.ts';
import { config } from '../../../src/server/env.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';
import { ask, openCrew } from './crew.ts';
import { answerWebhook } from './text-desk.ts';

const crew = openCrew();

interface Call {
  path: string;
  parameters: Record<string, string>;
  token?: string;
  signature?: string | null;
  signedUrl?: string;
}

/** A webhook as the service would call it, or as somebody else might. */
function webhook({ path, parameters, token, signature, signedUrl }: Call): Promise<number> {
  const { appUrl, texts } = config();
  const signed = twilio.getExpectedTwilioSignature(
    token ?? texts.authToken,
    signedUrl ?? appUrl + path,
    parameters,
  );
  const headers = new Headers({ 'content-type': 'application/x-www-form-urlencoded' });
  if (signature !== null) headers.set('x-twilio-signature', signature ?? signed);
  const body = new URLSearchParams(parameters).toString();
  return answerWebhook(new Request(`http://somewhere.invalid${path}`, { method: 'POST', headers, body }));
}

function inbound(change: Record<string, string> = {}): Record<string, string> {
  return {
    MessageSid: `SM${newId()}`,
    From: crew.phone,
    To: crew.number,
    Body: '41.5',
    NumMedia: '0',
    ...change,
  };
}

async function inboxTexts() {
  return database()('inbox_texts').where({ shop_id: crew.shop.shopId }).orderBy('sent_at');
}

async function sentConsent(): Promise<{ id: string; providerId: string }> {
  await crew.desk.setFaults({ webhooks: 'off' });
  await ask(crew);
  await crew.desk.setFaults({ webhooks: 'on' });
  const { id, provider_id } = await database()('messages').where({ shop_id: crew.shop.shopId }).first();
  return { id, providerId: provider_id };
}

async function stateOf(id: string) {
  return database()('messages').where({ id }).first('state', 'provider_status', 'error_code');
}

describe('the inbound webhook', () => {
  const path = '/api/texts/inbound';

  it('is kept once, however often it comes', async () => {
    const parameters = inbound();
    expect(await webhook({ path, parameters })).toBe(200);
    await crew.desk.work();
    const [kept] = await inboxTexts();
    expect(kept).toMatchObject({ person_id: crew.ana, from_phone: null, body: '41.5', state: 'set aside' });
    expect(await webhook({ path, parameters })).toBe(200);
    expect(await inboxTexts()).toEqual([kept]);
  });

  it('is refused when it is forged in any way, and leaves nothing', async () => {
    const parameters = inbound();
    const good = twilio.getExpectedTwilioSignature(
      config().texts.authToken,
      config().appUrl + path,
      parameters,
    );
    const forged: Call[] = [
      { path, parameters, token: 'somebody else' },
      { path, parameters, signature: null },
      { path, parameters, signature: '' },
      { path, parameters: { ...parameters, Body: 'OK' }, signature: good },
      { path, parameters: { ...parameters, Extra: '1' }, signature: good },
      { path: `${path}?x=1`, parameters, signature: good },
      { path, parameters, signedUrl: `http://somewhere.invalid${path}` },
    ];
    for (const call of forged) expect(await webhook(call)).toBe(403);
    expect(await inboxTexts()).toEqual([]);
  });

  it('keeps the addresses of pictures, and takes no form without its sender', async () => {
    const media = {
      NumMedia: '1',
      MediaUrl0: 'https://api.example/media/1',
      MediaContentType0: 'image/jpeg',
    };
    expect(await webhook({ path, parameters: inbound(media) })).toBe(200);
    const [kept] = await inboxTexts();
    expect(JSON.parse(kept.media)).toEqual({
      v: 1,
      items: [{ url: 'https://api.example/media/1', type: 'image/jpeg' }],
      unlisted: 0,
    });
    const { From: _from, ...nameless } = inbound();
    expect(await webhook({ path, parameters: nameless })).toBe(400);
  });

  it('of a number of no shop is answered and dropped', async () => {
    expect(await webhook({ path, parameters: inbound({ To: '+12025550999' }) })).toBe(200);
    expect(await inboxTexts()).toEqual([]);
  });

  it('finds the person in the shop that was texted, when two shops know the phone', async () => {
    const other = await buildShop();
    await buildPerson(other, ['operator'], { phone: crew.phone });
    await webhook({ path, parameters: inbound() });
    expect(await inboxTexts()).toMatchObject([{ person_id: crew.ana }]);
    expect(await database()('inbox_texts').where({ shop_id: other.shopId })).toEqual([]);
  });
});

describe('the status webhook', () => {
  const report = (
    id: string,
    providerId: string,
    status: string,
    change: Record<string, string> = {},
  ): Call => ({
    path: `/api/texts/status?m=${id}`,
    parameters: {
      MessageSid: providerId,
      From: crew.number,
      To: crew.phone,
      MessageStatus: status,
      ...change,
    },
  });

  it('only ever rises, in any order and any number', async () => {
    const { id, providerId } = await sentConsent();
    expect(await stateOf(id)).toMatchObject({ state: 'sent', provider_status: 'accepted' });
    for (const status of ['delivered', 'sent', 'queued', 'delivered', 'undelivered']) {
      expect(await webhook(report(id, providerId, status))).toBe(200);
    }
    expect(await stateOf(id)).toEqual({ state: 'delivered', provider_status: 'delivered', error_code: null });
  });

  it('may say that a text was not delivered, and why', async () => {
    const { id, providerId } = await sentConsent();
    await webhook(report(id, providerId, 'undelivered', { ErrorCode: '30003' }));
    expect(await stateOf(id)).toMatchObject({ state: 'failed', error_code: '30003' });
  });

  it('is refused when it is forged, and moves nothing', async () => {
    const { id, providerId } = await sentConsent();
    const good = report(id, providerId, 'delivered');
    expect(await webhook({ ...good, token: 'somebody else' })).toBe(403);
    expect(await webhook({ ...good, signedUrl: `${config().appUrl}/api/texts/status` })).toBe(403);
    expect(await stateOf(id)).toMatchObject({ state: 'sent' });
  });

  it('of another shop, of no message or of another text moves nothing', async () => {
    const { id, providerId } = await sentConsent();
    const other = await buildShop({ text_number: '+12025550777' });
    expect(other.shopId).not.toBe(crew.shop.shopId);
    expect(await webhook(report(id, providerId, 'delivered', { From: '+12025550777' }))).toBe(200);
    expect(await webhook(report(newId(), providerId, 'delivered'))).toBe(200);
    expect(await webhook(report(id, 'SMother', 'delivered'))).toBe(200);
    expect(await webhook({ ...report(id, providerId, 'delivered'), path: '/api/texts/status' })).toBe(200);
    expect(await stateOf(id)).toMatchObject({ state: 'sent', provider_status: 'accepted' });
  });
});

describe('texts that came while nobody listened', () => {
  it('are found by asking, in their order, once, and read', async () => {
    await sentConsent();
    await crew.desk.setFaults({ webhooks: 'off' });
    for (const body of ['who is this', 'OK'])
      await crew.desk.textFromPhone({ from: crew.phone, to: crew.number, body });
    await crew.desk.setFaults({ webhooks: 'on' });
    expect(await inboxTexts()).toEqual([]);

    expect(await catchUpTexts(database(), crew.desk.gateway)).toBe(2);
    expect(await catchUpTexts(database(), crew.desk.gateway)).toBe(0);
    await crew.desk.work();
    expect((await inboxTexts()).map(({ body, state, intent }) => [body, state, intent])).toEqual([
      ['who is this', 'set aside', 'unreadable'],
      ['OK', 'read', 'agree'],
    ]);
    expect(await database()('people').where({ id: crew.ana }).first('consent')).toEqual({
      consent: 'agreed',
    });
  });

  it('are not read twice when the webhook comes late', async () => {
    await sentConsent();
    await crew.desk.setFaults({ webhooks: 'off' });
    await crew.desk.textFromPhone({ from: crew.phone, to: crew.number, body: 'OK' });
    await crew.desk.setFaults({ webhooks: 'on' });
    await catchUpTexts(database(), crew.desk.gateway);
    await crew.desk.work();
    const missed = (await crew.desk.deliveries()).filter(
      ({ kind, parameters }) => kind === 'inbound' && parameters['From'] === crew.phone,
    );
    await fetch(`${crew.desk.textsUrl}/fake/deliveries/${missed[0]?.number}/again`, { method: 'POST' });
    await vi.waitFor(async () => {
      expect((await crew.desk.deliveries()).find(({ number: n }) => n === missed[0]?.number)).toMatchObject({
        httpStatus: 200,
      });
    });
    await crew.desk.work();
    const practices = await database()('messages').where({ shop_id: crew.shop.shopId, template: 'practice' });
    expect(practices).toHaveLength(1);
  });

  it('are looked for again when the service could not answer', async () => {
    await crew.desk.textFromPhone({ from: '+12025556666', to: crew.number, body: 'first' });
    await vi.waitFor(async () => expect(await inboxTexts()).toHaveLength(1));
    await crew.desk.setFaults({ webhooks: 'off', delayMilliseconds: 700 });
    await crew.desk.textFromPhone({ from: '+12025556666', to: crew.number, body: 'second' });
    expect(await catchUpTexts(database(), crew.desk.gateway)).toBe(0);
    await crew.desk.setFaults({ webhooks: 'on', delayMilliseconds: 0 });
    expect(await catchUpTexts(database(), crew.desk.gateway)).toBe(1);
  });
});
