import { now } from '../../server/clock.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { log } from '../../server/log.ts';
import {
  blankMessage,
  changeMessage,
  findMessage,
  type MessageChange,
  type StoredMessage,
} from './message.repository.ts';
import { isNews, mayMove, optedOutCode, readProviderStatus, stateOfStatus } from './message.ts';
import { isTemplateName, templates } from './templates.ts';
import { withdrawConsent } from './withdrawal.service.ts';

/** What the service says about one message. */
export interface DeliveryReport {
  providerId: string;
  /** The service's own word. */
  status: string;
  errorCode?: string | undefined;
  segments?: number | undefined;
}

/**
 * Takes in what the service says about a message, from its answer, its webhook or its list. Reports come in any order
 * and more than once: what it said only ever rises.
 */
export async function recordReport(
  scope: ShopScope,
  messageId: string,
  report: DeliveryReport,
): Promise<void> {
  await inTransaction(scope, async (inside) => {
    const message = await findMessage(inside, messageId);
    if (message === null) return;
    if (message.providerId !== null && message.providerId !== report.providerId) {
      // The service holds this message twice. Nothing can call the second one back, but somebody must know.
      log.error({ event: 'sent-twice', messageId });
      return;
    }
    const change = readReport(message, report);
    await changeMessage(inside, message, change);
    if (change.state === undefined) return;
    await blankSecret(inside, message);
    if (report.errorCode === optedOutCode) await noteOptOut(inside, message);
  });
}

function readReport(message: StoredMessage, report: DeliveryReport): Partial<MessageChange> {
  const change: Partial<MessageChange> = message.providerId === null ? { providerId: report.providerId } : {};
  if (report.segments !== undefined) change.segments = report.segments;
  const status = readProviderStatus(report.status);
  if (status === undefined || !isNews(message.providerStatus, status)) return change;
  change.providerStatus = status;
  const state = stateOfStatus(status);
  if (!mayMove(message.state, state)) return change;
  return {
    ...change,
    state,
    leaseUntil: null,
    leaseBy: null,
    sentAt: message.sentAt ?? now(),
    ...(state === 'failed' ? { errorCode: report.errorCode ?? 'undelivered' } : {}),
  };
}

/** Gives a message up. Call it in a transaction, with the message as it is there. */
export async function failMessage(scope: ShopScope, message: StoredMessage, code: string): Promise<void> {
  const moved =
    mayMove(message.state, 'failed') &&
    (await changeMessage(scope, message, {
      state: 'failed',
      errorCode: code,
      leaseUntil: null,
      leaseBy: null,
    }));
  if (!moved) return;
  await blankSecret(scope, message);
  if (code === optedOutCode) await noteOptOut(scope, message);
}

async function blankSecret(scope: ShopScope, message: StoredMessage): Promise<void> {
  const { template, id } = message;
  if (isTemplateName(template) && templates[template].holdsSecret) await blankMessage(scope, id);
}

/** The service knows of an opt-out that we have not heard of. */
async function noteOptOut(scope: ShopScope, message: StoredMessage): Promise<void> {
  const { personId, recipient: phone } = message;
  if (personId !== null) await withdrawConsent(scope, { personId, phone, how: 'service' });
}
