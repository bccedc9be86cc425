import twilio from 'twilio';
import { describe, expect, it } from 'vitest';
import { readRetryAfter, readTextServiceError, TextServiceBusy } from './text-service-error.ts';

function refusal(status: number, code: number): Error {
  return new twilio.RestException({
    statusCode: status,
    body: JSON.stringify({ status, code, message: 'no' }),
  });
}

describe('reading a failed call of the text service', () => {
  it('takes a refusal for good, with the code of the service', () => {
    expect(readTextServiceError(refusal(400, 21_610))).toEqual({ outcome: 'refused', code: '21610' });
  });

  it('waits when the fault lies in our set-up', () => {
    expect(readTextServiceError(refusal(401, 20_003))).toEqual({ outcome: 'retryLater', code: '20003' });
  });

  it('waits as long as the service asks for', () => {
    const busy = new TextServiceBusy(429, 30);
    expect(readTextServiceError(busy)).toEqual({ outcome: 'retryLater', code: '429', retryAfterSeconds: 30 });
    expect(readTextServiceError(new TextServiceBusy(503, undefined))).toEqual({
      outcome: 'retryLater',
      code: '503',
    });
  });

  it('is unsure where the service may have taken the text', () => {
    for (const error of [new TextServiceBusy(502, undefined), new TextServiceBusy(504, undefined)]) {
      expect(readTextServiceError(error).outcome).toBe('unsure');
    }
    for (const code of ['ECONNABORTED', 'ETIMEDOUT', 'ECONNRESET', 'EPIPE']) {
      const broken = Object.assign(new Error('line'), { code });
      expect(readTextServiceError(broken)).toEqual({ outcome: 'unsure', code });
    }
    expect(readTextServiceError('?')).toEqual({ outcome: 'unsure', code: 'unknown' });
  });

  it('knows that a text cannot have arrived where no connection was made', () => {
    const refused = Object.assign(new Error('line'), { code: 'ECONNREFUSED' });
    expect(readTextServiceError(refused)).toEqual({ outcome: 'retryLater', code: 'ECONNREFUSED' });
  });
});

describe('Retry-After', () => {
  const now = Date.UTC(2024, 2, 1, 9, 0, 0);
  it.each([
    ['120', 120],
    ['0', 0],
    ['Fri, 01 Mar 2024 09:01:30 GMT', 90],
    ['Fri, 01 Mar 2024 08:00:00 GMT', 0],
    ['soon', undefined],
    [undefined, undefined],
    [['1', '2'], undefined],
  ])('%j', (header, seconds) => {
    expect(readRetryAfter(header, now)).toBe(seconds);
  });
});
