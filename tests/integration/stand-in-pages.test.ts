import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createInterface } from 'node:readline';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { type StandIns, startStandIns, testAccount } from './stand-ins.ts';
import { startWebhookListener, type WebhookListener } from './webhook-listener.ts';

const number = '+15550100001';
const phone = '+15550100101';
const path = `/phones/${encodeURIComponent(phone)}/${encodeURIComponent(number)}`;

let folder: string;
let listener: WebhookListener;
let standIns: StandIns;

beforeEach(async () => {
  folder = mkdtempSync(join(tmpdir(), 'trywell-fakes-'));
  listener = await startWebhookListener();
  standIns = await startStandIns(listener.url, {
    clockOffsetFile: join(folder, 'offset'),
    phones: [{ phone, name: 'Ana' }],
    numbers: [number],
  });
});

afterEach(async () => {
  await standIns.stop();
  await listener.stop();
  rmSync(folder, { recursive: true });
});

async function get(where: string): Promise<string> {
  const response = await fetch(standIns.textsUrl + where);
  expect(response.status).toBe(200);
  return response.text();
}

function post(where: string, fields: Record<string, string>, headers: Record<string, string> = {}) {
  const body = new URLSearchParams(fields);
  return fetch(standIns.textsUrl + where, { method: 'POST', body, headers, redirect: 'manual' });
}

describe('the phones on a page', () => {
  it('let a person answer as the operator, and show how long each text is', async () => {
    expect(await get('/')).toContain('Ana');
    const answered = await post(path, { body: '  41.5 <b>\r\n& 40,8 ' });
    expect(answered.status).toBe(303);
    expect(answered.headers.get('location')).toBe(path);
    await vi.waitFor(() => expect(listener.heard).toHaveLength(1));
    expect(listener.heard[0]?.parameters).toMatchObject({
      From: phone,
      To: number,
      Body: '41.5 <b>\n& 40,8',
    });
    const page = await get(path);
    expect(page).toContain('41.5 &#60;b&#62;\n&#38; 40,8');
    expect(page).toContain('15 plain letters, 1 segment');
  });

  it('say when a phone has opted out', async () => {
    await post(path, { body: 'STOP' });
    expect(await get(path)).toContain('This phone has opted out.');
    expect(await get('/webhooks')).toContain('Text came in: STOP');
  });

  it('ignore an empty answer and lead back from a phone that is not there', async () => {
    await post(path, { body: '   ' });
    expect(await standIns.texts()).toEqual([]);
    const nowhere = await fetch(`${standIns.textsUrl}/phones/1/2`, { redirect: 'manual' });
    expect(nowhere.status).toBe(303);
  });

  it('turn webhooks off and on', async () => {
    await post('/webhooks/off', {});
    await post(path, { body: '41.5' });
    expect(await get('/webhooks')).toContain('missed');
    await post('/webhooks/on', {});
    await post('/webhooks/1/again', {});
    await vi.waitFor(() => expect(listener.heard).toHaveLength(1));
  });
});

describe('the clock', () => {
  it('moves on by an hour in the file that every process reads', async () => {
    const file = join(folder, 'offset');
    expect(existsSync(file)).toBe(false);
    const moved = await post('/clock/hour', { back: '/mail' });
    expect(moved.headers.get('location')).toBe('/mail');
    await post('/clock/hour', { back: 'https://elsewhere.example' });
    expect(readFileSync(file, 'utf8')).toBe('7200000');
    expect(await get('/phones')).toContain('2 h ahead');
    writeFileSync(file, '-3600000');
    expect(await get('/phones')).toContain('1 h behind');
    const text = await standIns.textFromPhone({ from: phone, to: number, body: 'x' });
    expect(Math.abs(text.createdAt - (Date.now() - 3_600_000))).toBeLessThan(5000);
  });
});

describe('the door', () => {
  it('is shut to pages from elsewhere and to names that are not this machine', async () => {
    const foreign = await post(path, { body: 'x' }, { origin: 'https://elsewhere.example' });
    expect(foreign.status).toBe(403);
    expect(await standIns.texts()).toEqual([]);
  });

  it('refuses faults that it does not know, long bodies and unknown addresses', async () => {
    const fault = (body: string) => fetch(`${standIns.textsUrl}/fake/faults`, { method: 'POST', body });
    expect((await fault('{"webhoks":"off"}')).status).toBe(422);
    expect((await fault('{')).status).toBe(400);
    expect((await fault(`"${'x'.repeat(17 * 1024 * 1024)}"`)).status).toBe(413);
    expect((await fetch(`${standIns.textsUrl}/nothing`)).status).toBe(404);
  });
});

describe('the process', () => {
  it('says when it is ready, refuses bad settings in words and ends with 0 when told to', async () => {
    const start = (env: Record<string, string>) =>
      spawn(process.execPath, ['--import', 'tsx', 'src/fakes/main.ts'], {
        env: { PATH: process.env['PATH'] ?? '', FAKES_HTTP_PORT: '0', FAKES_SMTP_PORT: '0', ...env },
      });
    const child = start({
      APP_URL: listener.url,
      TWILIO_ACCOUNT_SID: testAccount.accountSid,
      TWILIO_AUTH_TOKEN: testAccount.authToken,
    });
    const [line] = await once(createInterface(child.stdout), 'line');
    const ready = /^READY (.*)$/.exec(String(line))?.[1] ?? '';
    const { textsUrl, mailUrl, smtpPort } = JSON.parse(ready);
    expect(mailUrl).toBe(`${textsUrl}/mail`);
    expect(smtpPort).toBeGreaterThan(0);
    expect((await fetch(`${textsUrl}/phones`)).status).toBe(200);
    child.kill('SIGTERM');
    expect(await once(child, 'exit')).toEqual([0, null]);

    const refused = start({ APP_URL: 'somewhere', TWILIO_ACCOUNT_SID: 'SK1' });
    let complaint = '';
    refused.stderr.on('data', (chunk: Buffer) => {
      complaint += chunk.toString();
    });
    expect(await once(refused, 'close')).toEqual([1, null]);
    expect(complaint).toContain('APP_URL');
    expect(complaint).toContain('TWILIO_ACCOUNT_SID');
  });
});
