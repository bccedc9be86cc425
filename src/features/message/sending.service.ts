import type { Knex } from 'knex';
import { now } from '../../server/clock.ts';
import { readAppState, replaceAppState } from '../../server/db/app-state.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { wakeWorker } from '../../server/wake.ts';
import { findAddressee } from './addressee.repository.ts';
import { failMessage, recordReport } from './delivery.service.ts';
import { changeMessage, findMessage, type StoredMessage } from './message.repository.ts';
import type { Channel } from './message.ts';
import { claimMessage, findNextDue, listLapsed, listShopsWithDue } from './outbox.repository.ts';
import { nextPause } from './retry-plan.ts';
import { decideSending } from './send-guard.ts';
import type { SendOutcome } from './send-outcome.ts';
import { isTemplateName, templates } from './templates.ts';

/** How long a worker may take over one attempt before somebody else looks into it. Longer than any gateway waits. */
export const leaseMilliseconds = 60_000;
const second = 1000;

export function workerScope(db: Knex, shopId: string): ShopScope {
  return { db, shopId, actor: { kind: 'worker', id: null } };
}

export const listSenders = (db: Knex, channel: Channel) => listShopsWithDue(db, channel, now());

/** `nothing` due, `paused` until the number's next turn, `settled` without a send, or claimed for one attempt. */
export type NextMessage =
  | { next: 'nothing' | 'settled' }
  | { next: 'paused'; milliseconds: number }
  | { next: 'claimed'; message: StoredMessage };

/**
 * Takes a shop's next message for one attempt. What may not go out is given up or put off here.
 * @param from.perSecond texts a second that the shop's number may send; undefined for mail, which has no such limit
 */
export async function takeNextMessage(
  scope: ShopScope,
  from: { channel: Channel; workerId: string; perSecond?: number },
): Promise<NextMessage> {
  const { channel, workerId, perSecond } = from;
  return inTransaction(scope, async (inside): Promise<NextMessage> => {
    const at = now();
    const due = await findNextDue(inside, channel, at);
    if (due === null) return { next: 'nothing' };
    if (!isTemplateName(due.template)) {
      await failMessage(inside, due, 'unknown-template');
      return { next: 'settled' };
    }
    const person = due.personId === null ? null : await findAddressee(inside, due.personId);
    const { recipient, urgent } = due;
    const decided = decideSending({ template: templates[due.template], recipient, urgent }, person, at);
    if (decided.decision === 'fail') {
      await failMessage(inside, due, decided.code);
      return { next: 'settled' };
    }
    if (decided.decision === 'wait') {
      await changeMessage(inside, due, { notBefore: decided.until });
      return { next: 'settled' };
    }
    const milliseconds = perSecond === undefined ? 0 : await takeTurn(inside, perSecond, at);
    if (milliseconds > 0) return { next: 'paused', milliseconds };
    const lease = { by: workerId, at, until: at + leaseMilliseconds };
    const message = await claimMessage(inside, due.id, lease);
    return message === null ? { next: 'nothing' } : { next: 'claimed', message };
  });
}

/**
 * Takes the number's next turn, which all workers share.
 * @returns 0, or the milliseconds until the next turn. A turn that lies far ahead comes from a clock moved back.
 */
async function takeTurn(scope: ShopScope, perSecond: number, at: number): Promise<number> {
  const pause = Math.ceil(second / perSecond);
  const key = `texts-turn:${scope.shopId}`;
  const before = await readAppState(scope.db, key);
  const left = before === null ? 0 : Number(before) - at;
  if (left > 0 && left <= pause) return left;
  const isOurs = await replaceAppState(scope.db, { key, before, after: String(at + pause) });
  return isOurs ? 0 : pause;
}

/** Keeps what became of an attempt, unless a webhook or another worker knows more by now. */
export async function recordOutcome(
  scope: ShopScope,
  attempt: StoredMessage,
  outcome: SendOutcome,
  random: () => number = Math.random,
): Promise<void> {
  if (outcome.outcome === 'accepted') {
    await recordReport(scope, attempt.id, outcome);
    return;
  }
  await inTransaction(scope, async (inside) => {
    const message = await findMessage(inside, attempt.id);
    if (message?.state !== 'sending' || message.leaseBy !== attempt.leaseBy) return;
    if (outcome.outcome === 'refused') return failMessage(inside, message, outcome.code);
    // A text's fate is told by the service's list; a mail server has none, so the mail goes again under the same
    // Message-ID.
    if (outcome.outcome === 'unsure' && message.channel === 'text') {
      await changeMessage(inside, message, { state: 'unsure', errorCode: outcome.code });
      return;
    }
    const retryAfterSeconds = outcome.outcome === 'retryLater' ? outcome.retryAfterSeconds : undefined;
    await putOff(inside, message, { code: outcome.code, retryAfterSeconds, random: random() });
  });
}

/** Back to waiting for the next attempt, or given up after the last. Call it in a transaction. */
export async function putOff(
  scope: ShopScope,
  message: StoredMessage,
  why: { code: string; retryAfterSeconds?: number | undefined; random: number },
): Promise<void> {
  const { code, retryAfterSeconds, random } = why;
  const pause = nextPause({ attempts: message.attempts, retryAfterSeconds, random });
  if (pause === null) return failMessage(scope, message, 'attempts');
  await changeMessage(scope, message, {
    state: 'waiting',
    notBefore: now() + pause,
    leaseUntil: null,
    leaseBy: null,
    errorCode: code,
  });
}

/**
 * Looks after attempts that nobody finished: a text may be out, so its fate is unsure; a mail goes again.
 * @returns how many there were
 */
export async function releaseLapsed(db: Knex, random: () => number = Math.random): Promise<number> {
  const lapsed = await listLapsed(db, now());
  for (const { id, shopId } of lapsed) {
    await inTransaction(workerScope(db, shopId), async (inside) => {
      const message = await findMessage(inside, id);
      if (message?.state !== 'sending' || (message.leaseUntil ?? 0) >= now()) return;
      const code = 'lapsed';
      if (message.channel === 'text')
        await changeMessage(inside, message, { state: 'unsure', errorCode: code });
      else await putOff(inside, message, { code, random: random() });
    });
  }
  // The list is asked at once: a run may hang on one of them, and nobody else will say.
  if (lapsed.length > 0) wakeWorker();
  return lapsed.length;
}
