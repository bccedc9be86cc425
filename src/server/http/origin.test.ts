import { describe, expect, it } from 'vitest';
import { isFromOurPages } from './origin.ts';

function request(method: string, origin?: string): Request {
  return new Request('http://127.0.0.1:4310/x', { method, headers: origin === undefined ? {} : { origin } });
}

describe('isFromOurPages', () => {
  it('lets everybody read', () => {
    expect(isFromOurPages(request('GET', 'https://other.example'), '/people')).toBe(true);
  });

  it('takes changes from our own pages', () => {
    expect(isFromOurPages(request('POST', 'http://127.0.0.1:4310'), '/people')).toBe(true);
  });

  it.each([
    undefined,
    'null',
    'https://other.example',
    'http://127.0.0.1:9',
    'http://127.0.0.1:4310.other.example',
  ])('refuses a change from %j', (origin) => {
    for (const method of ['POST', 'PATCH', 'PUT', 'DELETE']) {
      expect(isFromOurPages(request(method, origin), '/api/people')).toBe(false);
    }
  });

  it('leaves the signed webhooks, and only them, to their signature', () => {
    expect(isFromOurPages(request('POST'), '/api/texts/inbound')).toBe(true);
    expect(isFromOurPages(request('POST'), '/api/texts/status')).toBe(true);
    expect(isFromOurPages(request('POST'), '/api/texts/inbound/../../people')).toBe(false);
  });
});
