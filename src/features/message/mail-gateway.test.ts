import { describe, expect, it } from 'vitest';
import { createMailGateway, readMailError, toHeaderText } from './mail-gateway.ts';

function mailError(fields: Record<string, unknown>): Error {
  return Object.assign(new Error('mail'), fields);
}

describe('reading a failed mail', () => {
  it.each([
    [{ code: 'EENVELOPE', responseCode: 550 }, 'refused', '550'],
    [{ code: 'EMESSAGE', responseCode: 451 }, 'retryLater', '451'],
    [{ code: 'EPROTOCOL', responseCode: 503 }, 'retryLater', '503'],
    [{ code: 'EAUTH', responseCode: 535 }, 'retryLater', 'EAUTH'],
    [{ code: 'ESOCKET', originalCode: 'ECONNREFUSED' }, 'retryLater', 'ESOCKET'],
    [{ code: 'ETIMEDOUT', timeoutType: 'GREETING_TIMEOUT' }, 'retryLater', 'ETIMEDOUT'],
    [{ code: 'ETIMEDOUT', timeoutType: 'SOCKET_TIMEOUT' }, 'unsure', 'ETIMEDOUT'],
    [{ code: 'ECONNECTION' }, 'unsure', 'ECONNECTION'],
    [{ code: 'EENVELOPE' }, 'refused', 'EENVELOPE'],
  ])('%j', (fields, outcome, code) => {
    expect(readMailError(mailError(fields))).toEqual({ outcome, code });
  });
});

describe('what goes into a header', () => {
  it('is one line, whatever was typed', () => {
    expect(toHeaderText('Dana\r\nBcc: everyone@example.com')).toBe('Dana Bcc: everyone@example.com');
    expect(toHeaderText('Minh\u2028Nguyễn\u0000')).toBe('Minh Nguyễn');
  });

  it('refuses more than one address without asking the server', async () => {
    const settings = { host: '127.0.0.1', port: 9, secure: false, requireTls: false };
    const gateway = createMailGateway({ ...settings, from: { name: 'Trywell', address: 'a@example.com' } });
    for (const address of [
      'a@example.com, b@example.com',
      'a@example.com\r\nRCPT TO:<b@example.com>',
      'a',
      '<a@b>',
    ]) {
      const sent = gateway.send({ messageId: '1', to: { name: '', address }, subject: 's', text: 't' });
      await expect(sent).resolves.toEqual({ outcome: 'refused', code: 'address' });
    }
    gateway.close();
  });
});
