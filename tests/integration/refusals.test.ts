import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type RunningApp, startApp } from '../setup/running-app.ts';

let running: RunningApp;
beforeAll(async () => {
  running = await startApp();
}, 60_000);
afterAll(() => running.stop());

function post(path: string, init: RequestInit = {}): Promise<Response> {
  const { headers, ...rest } = init;
  return fetch(`${running.url}${path}`, {
    method: 'POST',
    redirect: 'manual',
    headers: { Origin: running.url, ...headers },
    ...rest,
  });
}

const json = { 'Content-Type': 'application/json' };
const formType = { 'Content-Type': 'application/x-www-form-urlencoded' };

describe('the edges', () => {
  it.each([
    ['no origin at all', { Origin: '' }],
    ['a foreign origin', { Origin: 'https://other.example' }],
    ['a hidden origin', { Origin: 'null' }],
    ['our name in front of another', { Origin: 'http://127.0.0.1.other.example' }],
  ])('refuse a change from %s', async (_what, headers) => {
    const answer = await post('/language', { headers: { ...formType, ...headers }, body: 'language=pl' });
    expect(answer.status).toBe(403);
    expect(answer.headers.get('set-cookie')).toBeNull();
  });

  it('answer programs with problem details in the reader’s language', async () => {
    const answer = await fetch(`${running.url}/api/nothing`, { headers: { 'Accept-Language': 'pl' } });
    expect(answer.status).toBe(404);
    expect(answer.headers.get('content-type')).toBe('application/problem+json');
    expect(await answer.json()).toMatchObject({
      type: 'about:blank',
      status: 404,
      code: 'not-found',
      detail: 'Tu nic nie ma. Mogło zostać przeniesione albo nigdy nie istniało.',
      requestId: answer.headers.get('x-request-id'),
    });
  });

  it('answer people with a page in their language, with the status', async () => {
    const answer = await fetch(`${running.url}/no/such/page`, { headers: { 'Accept-Language': 'vi' } });
    expect(answer.status).toBe(404);
    expect(answer.headers.get('content-type')).toBe('text/html; charset=utf-8');
    expect(await answer.text()).toContain('Ở đây không có gì');
  });

  it('refuse a body beyond its limit before reading it', async () => {
    const answer = await post('/language', { headers: formType, body: `language=${'x'.repeat(1_000_000)}` });
    expect(answer.status).toBe(413);
    expect(await answer.json()).toMatchObject({ code: 'too-large' });
  });

  it('refuse a body of unknown length', async () => {
    const stream = new ReadableStream({
      start(controller) {
        controller.enqueue(new TextEncoder().encode('language=pl'));
        controller.close();
      },
    });
    const answer = await post('/language', {
      headers: formType,
      body: stream,
      duplex: 'half',
    } as RequestInit);
    expect(answer.status).toBe(411);
  });

  it.each([
    ['emoji', '🧨'],
    ['SQL', "pl'; drop table shops; --"],
    ['HTML', '<script>alert(1)</script>'],
    ['nothing', ''],
    ['another language', 'de'],
    ['a number', '0'],
  ])('do not take %s for a language', async (_what, language) => {
    const answer = await post('/language', {
      headers: formType,
      body: new URLSearchParams({ language }).toString(),
    });
    expect(answer.status).toBe(422);
    expect(answer.headers.get('set-cookie')).toBeNull();
    expect(await answer.text()).not.toContain('<script>alert(1)');
  });

  it('refuse a form that is none', async () => {
    const answer = await post('/language', { headers: json, body: '{"language":"pl"}' });
    expect(answer.status).toBe(415);
  });

  it('never send anybody to another site', async () => {
    for (const next of ['https://other.example/', '//other.example', '/\\other.example']) {
      const body = new URLSearchParams({ language: 'pl', next }).toString();
      const answer = await post('/language', { headers: formType, body });
      expect(answer.status).toBe(303);
      expect(answer.headers.get('location')).toBe('/');
    }
  });

  it('carry the security headers and a content policy without exceptions', async () => {
    const { headers } = await fetch(running.url);
    const policy = headers.get('content-security-policy') ?? '';
    expect(policy).toContain("default-src 'self'");
    expect(policy).not.toContain('unsafe');
    expect(headers.get('x-content-type-options')).toBe('nosniff');
    expect(headers.get('referrer-policy')).toBe('same-origin');
  });

  it('do not believe forwarding headers', async () => {
    const answer = await fetch(running.url, {
      headers: { 'X-Forwarded-Host': 'other.example', Host: 'other.example' },
    });
    expect(await answer.text()).not.toContain('other.example');
  });
});
