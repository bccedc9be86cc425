import type { Language } from '../../i18n/languages.ts';
import { now } from '../../server/clock.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { newId } from '../../server/ids.ts';
import { findAddressee } from './addressee.repository.ts';
import { insertMessage } from './message.repository.ts';
import { type TemplateName, type TemplateParams, templates } from './templates.ts';
import { writeMessage } from './write-message.ts';

interface MessageWish<Name extends TemplateName> {
  template: Name;
  params: TemplateParams<Name>;
  /** Says what the message is for, e.g. `run-prompt:<run>:<n>`; the same purpose is written once. */
  dedupe: string;
  /** Safety texts: before all others and at any hour. */
  urgent?: boolean;
  /** Milliseconds UTC; at once unless told. */
  notBefore?: number;
  trialId?: string;
  runId?: string;
}

export type QueuedMessage =
  | { queued: true; id: string }
  /** `already`: that purpose has its message. `no-address`: there is no phone, or no mail address, to send it to. */
  | { queued: false; reason: 'already' | 'no-address' };

/**
 * Writes a message to one of the shop's people, in the transaction of the change that causes it. Whether it may go out
 * (consent, number, hours) is decided when its turn comes.
 * @throws RangeError outside a transaction; AppError `not-found` where the shop has no such person
 */
export async function queueMessage<Name extends TemplateName>(
  scope: ShopScope,
  wish: MessageWish<Name> & { personId: string },
): Promise<QueuedMessage> {
  const person = await findAddressee(scope, wish.personId);
  if (person === null) throw new AppError('not-found', { detail: 'queueMessage: no such person' });
  const recipient = templates[wish.template].channel === 'text' ? person.phone : person.email;
  if (recipient === null) return { queued: false, reason: 'no-address' };
  return write(scope, wish, {
    personId: person.personId,
    recipient,
    language: person.language,
    plainLetters: person.plainLetters,
  });
}

/**
 * Writes a mail to an address that is not (or no longer) a person's own, e.g. to the address before a change.
 * @throws RangeError outside a transaction, or for a template that is no mail
 */
export async function queueMailTo<Name extends TemplateName>(
  scope: ShopScope,
  wish: MessageWish<Name> & { address: string; language: Language; personId?: string },
): Promise<QueuedMessage> {
  if (templates[wish.template].channel !== 'mail') {
    throw new RangeError('queueMailTo: wish.template is not a mail');
  }
  return write(scope, wish, {
    personId: wish.personId ?? null,
    recipient: wish.address,
    language: wish.language,
    plainLetters: false,
  });
}

async function write<Name extends TemplateName>(
  scope: ShopScope,
  wish: MessageWish<Name>,
  to: { personId: string | null; recipient: string; language: Language; plainLetters: boolean },
): Promise<QueuedMessage> {
  if (!scope.db.isTransaction) throw new RangeError('queueMessage: scope must hold a transaction');
  const { template, params, dedupe, urgent = false, trialId = null, runId = null } = wish;
  const { channel, version } = templates[template];
  const { language, plainLetters } = to;
  const written = writeMessage({ template, params, language, plainLetters });
  const at = now();
  const id = newId();
  const isNew = await insertMessage(scope, {
    id,
    channel,
    template,
    templateVersion: version,
    params,
    language,
    recipient: to.recipient,
    ...written,
    personId: to.personId,
    trialId,
    runId,
    dedupe,
    urgent,
    notBefore: wish.notBefore ?? at,
    createdAt: at,
  });
  return isNew ? { queued: true, id } : { queued: false, reason: 'already' };
}
