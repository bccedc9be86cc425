import type { AddressInfo } from 'node:net';
import { createServer } from 'node:net';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { createMailGateway, type MailGateway } from '../../src/features/message/mail-gateway.ts';
import { type StandIns, startStandIns } from './stand-ins.ts';

const from = { name: 'Trywell', address: 'texts@trywell.example' };
const mail = {
  messageId: '0190',
  to: { name: 'Łucja Nguyễn', address: 'lucja@example.com' },
  subject: 'Zaproszenie: “Linia 3”',
  text: 'Otwórz https://trywell.example/invite/abc i zacznij.\n\nDo 1 marca.',
};

let standIns: StandIns;
let gateway: MailGateway;

function openGateway(port: number): MailGateway {
  return createMailGateway({
    host: '127.0.0.1',
    port,
    secure: false,
    requireTls: false,
    from,
    timeoutMilliseconds: 500,
  });
}

beforeEach(async () => {
  standIns = await startStandIns('http://127.0.0.1:9');
  gateway = openGateway(standIns.smtpPort);
});

afterEach(async () => {
  gateway.close();
  await standIns.stop();
});

it('hands a mail over whole, in any letters, with links to follow on the page', async () => {
  await expect(gateway.send(mail)).resolves.toEqual({
    outcome: 'accepted',
    providerId: '<0190@trywell.example>',
    status: 'sent',
  });
  const [kept] = await standIns.mails();
  expect(kept).toMatchObject({
    recipients: ['lucja@example.com'],
    to: 'Łucja Nguyễn <lucja@example.com>',
    subject: mail.subject,
    text: mail.text,
    messageId: '<0190@trywell.example>',
  });
  const page = await (await fetch(`${standIns.mailUrl}/${kept?.id}`)).text();
  expect(page).toContain('<a href="https://trywell.example/invite/abc">');
});

it('writes what was typed into one header and no other', async () => {
  const to = { name: 'Dana\r\nBcc: eve@example.com', address: 'dana@example.com' };
  await gateway.send({ ...mail, to, subject: 'Hello\r\nCc: eve@example.com\r\n\r\nBody' });
  const [kept] = await standIns.mails();
  expect(kept?.recipients).toEqual(['dana@example.com']);
  expect(kept?.subject).toBe('Hello Cc: eve@example.com Body');
  expect(kept?.text).toBe(mail.text);
});

it('tells a passing refusal from a final one', async () => {
  await standIns.setFaults({ refuseNextMails: { count: 1, code: 451 } });
  await expect(gateway.send(mail)).resolves.toEqual({ outcome: 'retryLater', code: '451' });
  await standIns.setFaults({ refuseNextMails: { count: 1, code: 550 } });
  await expect(gateway.send(mail)).resolves.toEqual({ outcome: 'refused', code: '550' });
  expect(await standIns.mails()).toEqual([]);
});

it('waits where nobody listens or nobody speaks', async () => {
  const closed = openGateway(9);
  await expect(closed.send(mail)).resolves.toMatchObject({ outcome: 'retryLater' });
  const silent = createServer(() => {});
  await new Promise<void>((resolve) => silent.listen(0, '127.0.0.1', resolve));
  const unanswered = openGateway((silent.address() as AddressInfo).port);
  await expect(unanswered.send(mail)).resolves.toMatchObject({ outcome: 'retryLater' });
  closed.close();
  unanswered.close();
  silent.close();
});
