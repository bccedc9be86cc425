import { setTimeout as wait } from 'node:timers/promises';
import type { MailGateway } from '../features/message/mail-gateway.ts';
import type { StoredMessage } from '../features/message/message.repository.ts';
import type { SendOutcome } from '../features/message/send-outcome.ts';
import {
  listSenders,
  recordOutcome,
  releaseLapsed,
  takeNextMessage,
  workerScope,
} from '../features/message/sending.service.ts';
import type { TextGateway } from '../features/message/text-gateway.ts';
import { describeError, log } from '../server/log.ts';
import type { Job, JobContext } from './loop.ts';

const pollMilliseconds = 500;

/** Each channel has a loop of its own, so that a mail server that hangs does not hold up a safety text. */
interface Sender {
  channel: 'text' | 'mail';
  perSecond?: number;
  send(message: StoredMessage, textNumber: string | null): Promise<SendOutcome>;
}

/** Sends waiting texts: one from each shop's number, then the next round. */
export function sendTexts(gateway: () => TextGateway, perSecond: () => number): Job {
  return {
    name: 'send-texts',
    everyMilliseconds: pollMilliseconds,
    run: (context) =>
      sendRound(context, {
        channel: 'text',
        perSecond: perSecond(),
        send: async ({ id, recipient, body }, textNumber) => {
          if (textNumber === null) return { outcome: 'retryLater', code: 'no-number' };
          return gateway().send({ messageId: id, from: textNumber, to: recipient, body });
        },
      }),
  };
}

/** Sends waiting mails. */
export function sendMails(gateway: () => MailGateway): Job {
  return {
    name: 'send-mails',
    everyMilliseconds: pollMilliseconds,
    run: (context) =>
      sendRound(context, {
        channel: 'mail',
        send: ({ id, recipient, subject, body }) =>
          gateway().send({
            messageId: id,
            to: { name: '', address: recipient },
            subject: subject ?? '',
            text: body,
          }),
      }),
  };
}

/**
 * One message for each shop that has one, all shops side by side: none waits for another's slow line. Waits a little
 * where all that is due has its turn soon.
 * @returns how many were dealt with, or 1 after such a wait
 */
async function sendRound(context: JobContext, sender: Sender): Promise<number> {
  const lapsed = await releaseLapsed(context.db);
  const shops = await listSenders(context.db, sender.channel);
  const served = await Promise.all(shops.map((shop) => serveShop(context, sender, shop)));
  const done = lapsed + served.filter((turn) => turn === 'done').length;
  const nextTurn = Math.min(...served.filter((turn) => typeof turn === 'number'));
  if (done > 0 || nextTurn > pollMilliseconds) return done;
  await wait(nextTurn);
  return 1;
}

/** @returns what came of it, or the milliseconds until the shop's number has its next turn */
async function serveShop(
  { db, workerId, stopping }: JobContext,
  { channel, perSecond, send }: Sender,
  { shopId, textNumber }: { shopId: string; textNumber: string | null },
): Promise<'done' | 'nothing' | number> {
  if (stopping()) return 'nothing';
  const scope = workerScope(db, shopId);
  try {
    const pace = perSecond === undefined ? {} : { perSecond };
    const taken = await takeNextMessage(scope, { channel, workerId, ...pace });
    if (taken.next === 'paused') return taken.milliseconds;
    if (taken.next !== 'claimed') return taken.next === 'settled' ? 'done' : 'nothing';
    const outcome = await send(taken.message, textNumber);
    await recordOutcome(scope, taken.message, outcome);
    return 'done';
  } catch (error) {
    // One shop's trouble is not the others'. An attempt that could not be recorded lapses and is looked into.
    log.error({ event: 'sending-failed', shopId, error: describeError(error) });
    return 'nothing';
  }
}
