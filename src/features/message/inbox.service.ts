import { readReservedWord } from '../../lib/messages/index.ts';
import { now } from '../../server/clock.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';
import { type FullAddressee, findAddressee, liftSuppression, suppressPhone } from './addressee.repository.ts';
import { findPersonByPhone } from './consent.repository.ts';
import { acceptConsent, reopenConsent } from './consent.service.ts';
import { moveConversation, readConversation } from './conversation.repository.ts';
import {
  closeInboxText,
  describeInboxText,
  type InboxMedia,
  type InboxText,
  insertInboxText,
} from './inbox.repository.ts';
import { queueMessage } from './message.service.ts';
import { readFirstMeaning } from './text-reading.ts';
import { withdrawConsent } from './withdrawal.service.ts';

export interface ReceivedText {
  providerId: string;
  from: string;
  body: string;
  media: InboxMedia;
  sentAt: number;
}

/**
 * Keeps a text that came in, once. It is read later, by the worker.
 * @returns false when it is there already
 */
export async function keepReceivedText(scope: ShopScope, text: ReceivedText): Promise<boolean> {
  const { providerId, from, body, media, sentAt } = text;
  const personId = await findPersonByPhone(scope, from);
  const fromPhone = personId === null ? from : null;
  return insertInboxText(scope, {
    id: newId(),
    providerId,
    personId,
    fromPhone,
    body,
    media,
    sentAt,
    receivedAt: now(),
  });
}

/** What a text means for the runs of a trial, which this feature knows nothing of. Both are called in the transaction. */
export interface RunTalk {
  /** Reads a text that is neither consent nor practice, and does what it asks. */
  converse(
    scope: ShopScope,
    person: FullAddressee,
    text: InboxText,
  ): Promise<{ intent: string; runId: string | null; isUsed: boolean }>;
  /** Somebody takes no more texts. */
  holdRunsOfOptOut(scope: ShopScope, personId: string): Promise<void>;
}

/** Reads one text and does what it asks, all or nothing. A text that somebody else has read is left alone. */
export async function readInboxText(scope: ShopScope, text: InboxText, runTalk: RunTalk): Promise<void> {
  await inTransaction(scope, async (inside) => {
    const person = text.personId === null ? null : await findAddressee(inside, text.personId);
    if (person === null) return readStranger(inside, text);
    const { state: conversation } = await readConversation(inside, person.personId);
    const meaning = readFirstMeaning(text.body, { ...person, conversation });
    if (meaning === 'other') return talkOfRuns(inside, person, text, runTalk);
    if (!(await closeInboxText(inside, text.id, { state: 'read', intent: meaning }))) return;

    if (meaning === 'optOut') {
      await optOut(inside, person);
      await runTalk.holdRunsOfOptOut(inside, person.personId);
    }
    if (meaning === 'askAgain') await reopenConsent(inside, person, text.id);
    if (meaning === 'agree') await acceptConsent(inside, person, text.id);
    if (meaning === 'decline') {
      await recordActivity(inside, { kind: 'consent.declined', subjectId: person.personId });
    }
    if (meaning === 'practiceDone') await endPractice(inside, person, text);
  });
}

/** Off the pile first, so that of two workers one alone acts on it; then with what was made of it. */
async function talkOfRuns(
  scope: ShopScope,
  person: FullAddressee,
  text: InboxText,
  { converse }: RunTalk,
): Promise<void> {
  if (!(await closeInboxText(scope, text.id, { state: 'set aside', intent: null }))) return;
  const { intent, runId, isUsed } = await converse(scope, person, text);
  await describeInboxText(scope, text.id, { state: isUsed ? 'read' : 'set aside', intent, runId });
}

async function optOut(scope: ShopScope, person: FullAddressee): Promise<void> {
  const { personId, phone } = person;
  if (phone !== null) await withdrawConsent(scope, { personId, phone, how: 'text' });
}

async function endPractice(scope: ShopScope, person: FullAddressee, text: InboxText): Promise<void> {
  const { personId } = person;
  await moveConversation(scope, { id: newId(), personId, state: 'idle' });
  await queueMessage(scope, {
    template: 'practiceSaved',
    params: { value: text.body.trim() },
    personId,
    dedupe: `practice-saved:${text.id}`,
  });
}

/** A number of nobody here: never answered, but its STOP holds, for whoever gets that number next. */
async function readStranger(scope: ShopScope, text: InboxText): Promise<void> {
  const reserved = text.fromPhone === null ? undefined : readReservedWord(text.body);
  const intent = reserved === 'stop' ? 'optOut' : null;
  if (!(await closeInboxText(scope, text.id, { state: 'set aside', intent }))) return;
  if (text.fromPhone === null) return;
  if (reserved === 'stop') await suppressPhone(scope, { id: newId(), phone: text.fromPhone, at: now() });
  if (reserved === 'start') await liftSuppression(scope, text.fromPhone);
}
