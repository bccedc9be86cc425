import { keyedHash } from '../../server/auth/token.ts';
import { now } from '../../server/clock.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { newId } from '../../server/ids.ts';
import { type FullAddressee, findAddressee, liftSuppression } from './addressee.repository.ts';
import { changeConsent } from './consent.repository.ts';
import { moveConversation } from './conversation.repository.ts';
import { cancelWaitingMessages } from './message.repository.ts';
import { type QueuedMessage, queueMessage } from './message.service.ts';
import { templates } from './templates.ts';

/**
 * Asks a person whether they may be texted. Asked again on another day, a person who said nothing gets the question
 * once more; on the same day they do not.
 * @param asker.name stands in the text; `asker.id` is kept with the consent
 * @throws AppError `not-found` where the shop has no such person; `not-now` where they have no phone, agreed already,
 *   or opted out (only they themselves can let texts in again)
 */
export async function askForConsent(
  scope: ShopScope,
  personId: string,
  asker: { id: string; name: string },
): Promise<QueuedMessage> {
  return inTransaction(scope, async (inside) => {
    const person = await findAddressee(inside, personId);
    if (person === null) throw new AppError('not-found');
    const mayAsk =
      person.active && !person.isSuppressed && (person.consent === 'unasked' || person.consent === 'asked');
    if (person.phone === null || !mayAsk) {
      throw new AppError('not-now', { detail: `consent is ${person.consent}` });
    }
    const day = new Date(now()).toISOString().slice(0, 10);
    const number = keyedHash('consent-question', person.phone).slice(0, 16);
    return sendQuestion(inside, person, { asker, round: `${number}:${day}` });
  });
}

/** Puts the question, in a transaction. */
async function sendQuestion(
  scope: ShopScope,
  person: FullAddressee,
  question: { asker: { id: string | null; name: string }; round: string },
): Promise<QueuedMessage> {
  const { personId, shopName } = person;
  const { asker, round } = question;
  const at = now();
  const wording = templates.consent.version;
  await changeConsent(
    scope,
    personId,
    { consent: 'asked', at: null, wording, how: 'text', ...(asker.id === null ? {} : { askedBy: asker.id }) },
    at,
  );
  await moveConversation(scope, { id: newId(), personId, state: 'asked' });
  await recordActivity(scope, { kind: 'consent.asked', subjectId: personId, details: { wording } });
  return queueMessage(scope, {
    template: 'consent',
    params: { shop: shopName, asker: asker.name },
    personId,
    dedupe: `consent:${personId}:${round}`,
  });
}

/** A person said OK: kept with its wording and time; practice follows. Call it in a transaction. */
export async function acceptConsent(
  scope: ShopScope,
  person: FullAddressee,
  inboxTextId: string,
): Promise<void> {
  const { personId, phone } = person;
  const at = now();
  await changeConsent(scope, personId, { consent: 'agreed', at, how: 'text' }, at);
  if (phone !== null) await liftSuppression(scope, phone);
  await moveConversation(scope, { id: newId(), personId, state: 'practice' });
  const details = { how: 'text', wording: templates.consent.version };
  await recordActivity(scope, { kind: 'consent.given', subjectId: personId, details });
  await queueMessage(scope, {
    template: 'practice',
    params: {},
    personId,
    dedupe: `practice:${inboxTextId}`,
  });
}

/**
 * A number that had opted out lets texts in again. That is leave to be asked, not consent: the question goes out to the
 * person who opted out, and nothing else until they say OK. Where somebody before them did, it is for the shop to ask.
 * Call it in a transaction.
 */
export async function reopenConsent(
  scope: ShopScope,
  person: FullAddressee,
  inboxTextId: string,
): Promise<void> {
  if (person.phone !== null) await liftSuppression(scope, person.phone);
  if (person.consent !== 'opted out') return;
  const asker = { id: null, name: person.askerName ?? person.shopName };
  await sendQuestion(scope, person, { asker, round: inboxTextId });
}

/**
 * A person's number has changed: what waits for the old one is dropped, and the new one must say OK itself. Call it in
 * the transaction of the change.
 */
export async function forgetConsentOfOldNumber(scope: ShopScope, personId: string): Promise<void> {
  const at = now();
  const nothing = { at: null, wording: null, how: null, askedBy: null };
  await cancelWaitingMessages(scope, personId, ['text']);
  await changeConsent(scope, personId, { consent: 'unasked', ...nothing }, at);
  await moveConversation(scope, { id: newId(), personId, state: 'unasked' });
  await recordActivity(scope, { kind: 'consent.reset', subjectId: personId });
}
