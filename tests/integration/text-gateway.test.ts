import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import twilio from 'twilio';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { TextGateway } from '../../src/features/message/text-gateway.ts';
import { createTwilioGateway } from '../../src/features/message/twilio-gateway.ts';
import { isSignedWebhook } from '../../src/features/message/webhook-signature.ts';
import { type StandIns, startStandIns, testAccount } from './stand-ins.ts';
import { startWebhookListener, type WebhookListener } from './webhook-listener.ts';

const publicUrl = 'https://trywell.example';
const number = '+15550100001';
const phone = '+15550100101';

let listener: WebhookListener;
let standIns: StandIns;
let gateway: TextGateway;

function openGateway(timeoutMilliseconds = 5000): TextGateway {
  return createTwilioGateway(
    { ...testAccount, apiUrl: standIns.textsUrl, publicUrl, timeoutMilliseconds },
    () => Date.now(),
  );
}

function send(body: string, messageId = 'message 1/ö') {
  return gateway.send({ messageId, from: number, to: phone, body });
}

beforeEach(async () => {
  listener = await startWebhookListener();
  standIns = await startStandIns(publicUrl, { webhookTarget: listener.url });
  gateway = openGateway();
});

afterEach(async () => {
  await standIns.stop();
  await listener.stop();
});

describe('a text on its way out', () => {
  it('is accepted, listed, and its status comes back signed over the public address with our id kept', async () => {
    const body = 'Zażółć gęślą jaźń & 100 % = 1+1\nDòng hai 🙂';
    const sent = await send(body);
    expect(sent).toMatchObject({ outcome: 'accepted', status: 'queued', segments: 1 });

    await vi.waitFor(() => expect(listener.heard).toHaveLength(2));
    expect(listener.heard.map(({ parameters }) => parameters['MessageStatus'])).toEqual([
      'sent',
      'delivered',
    ]);
    for (const { path, headers, parameters } of listener.heard) {
      expect(path).toBe('/api/texts/status?m=message+1%2F%C3%B6');
      const signature = String(headers['x-twilio-signature']);
      const url = publicUrl + path;
      expect(twilio.validateRequest(testAccount.authToken, signature, url, parameters)).toBe(true);
      expect(twilio.validateRequest('another token', signature, url, parameters)).toBe(false);
      expect(isSignedWebhook({ authToken: testAccount.authToken, url, signature, parameters })).toBe(true);
      const forged = { ...parameters, MessageStatus: 'undelivered' };
      expect(isSignedWebhook({ authToken: testAccount.authToken, url, signature, parameters: forged })).toBe(
        false,
      );
      expect(isSignedWebhook({ authToken: testAccount.authToken, url, signature: null, parameters })).toBe(
        false,
      );
    }

    const listed = await gateway.listSent({ from: number, to: phone, since: Date.now() - 5000 });
    expect(listed).toMatchObject({
      outcome: 'listed',
      texts: [{ from: number, to: phone, body, status: 'delivered' }],
    });
    const before = await gateway.listSent({ from: number, to: phone, since: Date.now() + 5000 });
    expect(before).toEqual({ outcome: 'listed', texts: [] });
    const toOther = await gateway.listSent({ from: number, to: '+15550100999', since: 0 });
    expect(toOther).toEqual({ outcome: 'listed', texts: [] });
  });

  it('is listed over several pages', async () => {
    const bodies = Array.from({ length: 230 }, (_, n) => `Text ${n}`);
    for (const body of bodies) await send(body);
    const listed = await gateway.listSent({ from: number, to: phone, since: 0 });
    const texts = listed.outcome === 'listed' ? listed.texts : [];
    expect(texts.map(({ body }) => body).sort()).toEqual([...bodies].sort());
  });

  it('is refused with the code of the service', async () => {
    await expect(gateway.send({ messageId: '1', from: number, to: '12', body: 'x' })).resolves.toEqual({
      outcome: 'refused',
      code: '21211',
    });
    await expect(gateway.send({ messageId: '1', from: 'Trywell', to: phone, body: 'x' })).resolves.toEqual({
      outcome: 'refused',
      code: '21606',
    });
    await expect(send('x'.repeat(1601))).resolves.toEqual({ outcome: 'refused', code: '21617' });
  });

  it('waits where the service is busy, once, as long as it asks', async () => {
    await standIns.setFaults({ failNextSends: { count: 2, status: 429, retryAfterSeconds: 7 } });
    await expect(send('a')).resolves.toEqual({ outcome: 'retryLater', code: '429', retryAfterSeconds: 7 });
    await standIns.setFaults({ failNextSends: { count: 1, status: 500 } });
    await expect(send('a')).resolves.toEqual({ outcome: 'retryLater', code: '500' });
    await expect(send('a')).resolves.toMatchObject({ outcome: 'accepted' });
    expect(await standIns.texts()).toHaveLength(1);
  });

  it('waits where the account does not match or nobody answers at all', async () => {
    const stranger = createTwilioGateway(
      { ...testAccount, authToken: 'wrong', apiUrl: standIns.textsUrl, publicUrl },
      () => Date.now(),
    );
    const text = { messageId: '1', from: number, to: phone, body: 'x' };
    await expect(stranger.send(text)).resolves.toEqual({ outcome: 'retryLater', code: '20003' });
    const nobody = createTwilioGateway({ ...testAccount, apiUrl: 'http://127.0.0.1:9', publicUrl }, () =>
      Date.now(),
    );
    await expect(nobody.send(text)).resolves.toEqual({ outcome: 'retryLater', code: 'ECONNREFUSED' });
    await expect(nobody.listReceived({ to: number, since: 0 })).resolves.toMatchObject({
      outcome: 'retryLater',
    });
  });

  it('stays unsure where the answer is lost, and the list tells that it went out', async () => {
    gateway = openGateway(300);
    await standIns.setFaults({ swallowNextAnswers: 1 });
    await expect(send('Did it go?')).resolves.toMatchObject({ outcome: 'unsure' });
    const listed = await gateway.listSent({ from: number, to: phone, since: Date.now() - 5000 });
    expect(listed).toMatchObject({ outcome: 'listed', texts: [{ body: 'Did it go?' }] });
  });

  it('stays unsure where the service is slower than we wait', async () => {
    gateway = openGateway(100);
    await standIns.setFaults({ delayMilliseconds: 400 });
    await expect(send('Slow')).resolves.toMatchObject({ outcome: 'unsure' });
  });

  it('may end undelivered', async () => {
    await standIns.setFaults({ undeliverNext: { count: 1, errorCode: 30_003 } });
    await send('x');
    await vi.waitFor(() => expect(listener.heard).toHaveLength(2));
    expect(listener.heard[1]?.parameters).toMatchObject({ MessageStatus: 'undelivered', ErrorCode: '30003' });
  });
});

describe('a text on its way in', () => {
  const textIn = (body: string) => standIns.textFromPhone({ from: phone, to: number, body });

  it('is told once, signed, and listed', async () => {
    const text = await textIn('41,5 N — đúng');
    await vi.waitFor(() => expect(listener.heard).toHaveLength(1));
    const [call] = listener.heard;
    expect(call).toMatchObject({
      path: '/api/texts/inbound',
      parameters: { MessageSid: text.sid, From: phone, To: number, Body: '41,5 N — đúng', NumMedia: '0' },
    });
    const signature = String(call?.headers['x-twilio-signature']);
    const url = `${publicUrl}/api/texts/inbound`;
    expect(twilio.validateRequest(testAccount.authToken, signature, url, call?.parameters ?? {})).toBe(true);
    const listed = await gateway.listReceived({ to: number, since: Date.now() - 5000 });
    expect(listed).toMatchObject({
      outcome: 'listed',
      texts: [{ providerId: text.sid, from: phone, mediaCount: 0 }],
    });
  });

  it('is not told again after a 5xx, and can be told by hand', async () => {
    listener.answerWith(503);
    await textIn('41.5');
    await vi.waitFor(async () => {
      expect(await standIns.deliveries()).toMatchObject([{ outcome: 'refused', httpStatus: 503 }]);
    });
    await new Promise((resolve) => setTimeout(resolve, 200));
    expect(listener.heard).toHaveLength(1);
    listener.answerWith(200);
    await fetch(`${standIns.textsUrl}/fake/deliveries/1/again`, { method: 'POST' });
    await vi.waitFor(() => expect(listener.heard).toHaveLength(2));
  });

  it('is told twice where that fault is on', async () => {
    await standIns.setFaults({ duplicateWebhooks: true });
    await textIn('41.5');
    await vi.waitFor(() => expect(listener.heard).toHaveLength(2));
    const [one, two] = listener.heard.map(({ parameters }) => parameters['MessageSid']);
    expect(one).toBe(two);
  });

  it('is missed while webhooks are off, and stays listed', async () => {
    await standIns.setFaults({ webhooks: 'off' });
    const text = await textIn('41.5');
    expect(await standIns.deliveries()).toMatchObject([{ kind: 'inbound', outcome: 'missed' }]);
    expect(listener.heard).toEqual([]);
    const listed = await gateway.listReceived({ to: number, since: 0 });
    expect(listed).toMatchObject({ texts: [{ providerId: text.sid }] });
  });
});

describe('the reserved words', () => {
  const textIn = (body: string) => standIns.textFromPhone({ from: phone, to: number, body });

  it('end texts and let them in again, with an answer of the service', async () => {
    await textIn('Stop');
    await expect(send('x')).resolves.toEqual({ outcome: 'refused', code: '21610' });
    await expect(
      gateway.send({ messageId: '2', from: '+15550100002', to: phone, body: 'x' }),
    ).resolves.toMatchObject({
      outcome: 'accepted',
    });
    await textIn('UNSTOP');
    await expect(send('x')).resolves.toMatchObject({ outcome: 'accepted' });
    await textIn('help');
    const answers = (await standIns.texts()).filter(({ direction }) => direction === 'outbound-reply');
    expect(answers).toHaveLength(3);
    const told = (await standIns.deliveries()).filter(({ kind }) => kind === 'inbound');
    expect(told.map(({ parameters }) => parameters['Body'])).toEqual(['Stop', 'UNSTOP', 'help']);
  });
});

describe('a restart of the stand-in', () => {
  it('keeps texts and opt-outs, and carries on with what was under way', async () => {
    const folder = mkdtempSync(join(tmpdir(), 'trywell-fakes-'));
    try {
      const change = { webhookTarget: listener.url, dataFolder: folder };
      const first = await startStandIns(publicUrl, { ...change, stepMilliseconds: 60_000 });
      gateway = createTwilioGateway({ ...testAccount, apiUrl: first.textsUrl, publicUrl }, () => Date.now());
      await send('Under way');
      await first.textFromPhone({ from: '+15550100109', to: number, body: 'STOP' });
      await first.stop();

      const second = await startStandIns(publicUrl, change);
      await vi.waitFor(async () => {
        const [text] = await second.texts();
        expect(text).toMatchObject({ body: 'Under way', status: 'delivered' });
      });
      gateway = createTwilioGateway({ ...testAccount, apiUrl: second.textsUrl, publicUrl }, () => Date.now());
      const refused = gateway.send({ messageId: '3', from: number, to: '+15550100109', body: 'x' });
      await expect(refused).resolves.toEqual({ outcome: 'refused', code: '21610' });
      await second.stop();
    } finally {
      rmSync(folder, { recursive: true });
    }
  });
});
