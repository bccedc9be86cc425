import { createMailGateway, type MailGateway } from '../features/message/mail-gateway.ts';
import type { TextGateway } from '../features/message/text-gateway.ts';
import { createTwilioGateway } from '../features/message/twilio-gateway.ts';
import { now } from '../server/clock.ts';
import { config } from '../server/env.ts';

let texts: TextGateway | undefined;
let mails: MailGateway | undefined;

/** The text service as configured. */
export function textGateway(): TextGateway {
  const { accountSid, authToken, apiUrl } = config().texts;
  texts ??= createTwilioGateway(
    { accountSid, authToken, apiUrl: apiUrl ?? undefined, publicUrl: config().appUrl },
    now,
  );
  return texts;
}

/** The mail server as configured. */
export function mailGateway(): MailGateway {
  const { host, port, user, password, from } = config().mail;
  mails ??= createMailGateway({
    host,
    port,
    secure: port === 465,
    // The stand-in on this machine speaks in the clear; nobody else may.
    requireTls: config().mode === 'live' && port !== 465,
    user: user ?? undefined,
    password: password ?? undefined,
    from: readSender(from),
  });
  return mails;
}

/** `Trywell <trywell@firm.example>`, or an address alone. */
function readSender(written: string): { name: string; address: string } {
  const found = /^(.*)<([^<>]+)>\s*$/.exec(written);
  if (found === null) return { name: 'Trywell', address: written.trim() };
  return { name: (found[1] ?? '').replace(/^[\s"]+|[\s"]+$/g, ''), address: (found[2] ?? '').trim() };
}
