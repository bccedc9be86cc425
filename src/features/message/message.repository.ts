import type { Knex } from 'knex';
import { z } from 'zod';
import { languages } from '../../i18n/languages.ts';
import { flag, moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { type Channel, type MessageState, messageStates, type ProviderStatus } from './message.ts';

const rowSchema = z
  .object({
    id: z.string(),
    shop_id: z.string(),
    channel: z.enum(['text', 'mail']),
    template: z.string(),
    language: z.enum(languages),
    recipient: z.string(),
    subject: z.string().nullable(),
    body: z.string(),
    person_id: z.string().nullable(),
    urgent: flag,
    state: z.enum(messageStates),
    not_before: moment,
    attempts: z.number(),
    first_attempt_at: moment.nullable(),
    lease_until: moment.nullable(),
    lease_by: z.string().nullable(),
    provider_id: z.string().nullable(),
    provider_status: z.enum(['accepted', 'sent', 'delivered', 'undelivered']).nullable(),
    error_code: z.string().nullable(),
    sent_at: moment.nullable(),
  })
  .transform((row) => ({
    id: row.id,
    shopId: row.shop_id,
    channel: row.channel,
    template: row.template,
    language: row.language,
    recipient: row.recipient,
    subject: row.subject,
    body: row.body,
    personId: row.person_id,
    urgent: row.urgent,
    state: row.state,
    notBefore: row.not_before,
    attempts: row.attempts,
    firstAttemptAt: row.first_attempt_at,
    leaseUntil: row.lease_until,
    leaseBy: row.lease_by,
    providerId: row.provider_id,
    providerStatus: row.provider_status,
    errorCode: row.error_code,
    sentAt: row.sent_at,
  }));

/** A message as it is stored. Moments in milliseconds UTC. */
export type StoredMessage = z.output<typeof rowSchema>;

export function readMessages(rows: unknown): StoredMessage[] {
  return z.array(rowSchema).parse(rows);
}

export interface NewMessage {
  id: string;
  channel: Channel;
  template: string;
  templateVersion: number;
  params: unknown;
  language: string;
  recipient: string;
  subject: string | null;
  body: string;
  segments: number | null;
  personId: string | null;
  trialId: string | null;
  runId: string | null;
  dedupe: string;
  urgent: boolean;
  notBefore: number;
  createdAt: number;
}

/** @returns false when a message with the same dedupe key is there already */
export async function insertMessage(scope: ShopScope, message: NewMessage): Promise<boolean> {
  const added = await scope
    .db('messages')
    .insert({
      id: message.id,
      shop_id: scope.shopId,
      channel: message.channel,
      template: message.template,
      template_version: message.templateVersion,
      params: JSON.stringify({ v: 1, params: message.params }),
      language: message.language,
      recipient: message.recipient,
      subject: message.subject,
      body: message.body,
      segments: message.segments,
      person_id: message.personId,
      trial_id: message.trialId,
      run_id: message.runId,
      dedupe: message.dedupe,
      urgent: message.urgent,
      state: 'waiting',
      not_before: message.notBefore,
      created_at: message.createdAt,
    })
    .onConflict(['shop_id', 'dedupe'])
    .ignore()
    .returning('id');
  return added.length > 0;
}

export async function findMessage(scope: ShopScope, id: string): Promise<StoredMessage | null> {
  const rows = await scope.db('messages').where({ shop_id: scope.shopId, id });
  return readMessages(rows)[0] ?? null;
}

export interface MessageChange {
  state: MessageState;
  notBefore: number;
  leaseUntil: number | null;
  leaseBy: string | null;
  providerId: string;
  providerStatus: ProviderStatus;
  errorCode: string | null;
  segments: number;
  sentAt: number;
}

/**
 * Changes a message that is still in the state it was read in.
 * @returns false when it no longer is
 */
export async function changeMessage(
  scope: ShopScope,
  message: Pick<StoredMessage, 'id' | 'state'>,
  change: Partial<MessageChange>,
): Promise<boolean> {
  const columns: Record<string, unknown> = {
    state: change.state,
    not_before: change.notBefore,
    lease_until: change.leaseUntil,
    lease_by: change.leaseBy,
    provider_id: change.providerId,
    provider_status: change.providerStatus,
    error_code: change.errorCode,
    segments: change.segments,
    sent_at: change.sentAt,
  };
  const set = Object.fromEntries(Object.entries(columns).filter(([, value]) => value !== undefined));
  if (Object.keys(set).length === 0) return true;
  const changed = await scope
    .db('messages')
    .where({ shop_id: scope.shopId, id: message.id, state: message.state })
    .update(set);
  return changed > 0;
}

/** Takes the words out of a message: they are no longer needed, or must not be kept. */
export async function blankMessage(scope: ShopScope, id: string): Promise<void> {
  await scope.db('messages').where({ shop_id: scope.shopId, id }).update(blankColumns);
}

export const blankColumns = { body: '', subject: null, params: '{"v":1}' } as const;

/** Cancels what waits for a person: texts only, or mails too. */
export async function cancelWaitingMessages(
  scope: ShopScope,
  personId: string,
  channels: readonly Channel[],
): Promise<number> {
  return scope
    .db('messages')
    .where({ shop_id: scope.shopId, person_id: personId, state: 'waiting' })
    .whereIn('channel', [...channels])
    .update({ state: 'cancelled' });
}

/** Which of these provider ids stand on a message already. */
export async function knownProviderIds(db: Knex, ids: readonly string[]): Promise<Set<string>> {
  const found: unknown[] = await db('messages')
    .whereIn('provider_id', [...ids])
    .pluck('provider_id');
  return new Set(found.map(String));
}

/** Cancels the texts of a trial that have not gone out, to whomever. */
export async function cancelTrialMessages(scope: ShopScope, trialId: string): Promise<void> {
  await scope
    .db('messages')
    .where({ shop_id: scope.shopId, trial_id: trialId, channel: 'text', state: 'waiting' })
    .update({ state: 'cancelled' });
}

/** Cancels the texts about a run that have not gone out. */
export async function cancelRunMessages(scope: ShopScope, runId: string): Promise<void> {
  await scope
    .db('messages')
    .where({ shop_id: scope.shopId, run_id: runId, channel: 'text', state: 'waiting' })
    .update({ state: 'cancelled' });
}

/** How many messages of a kind a run has had since a moment. */
export async function countMessages(
  scope: ShopScope,
  which: { template: string; runId: string; since: number },
): Promise<number> {
  const [row] = await scope
    .db('messages')
    .where({ shop_id: scope.shopId, run_id: which.runId, template: which.template })
    .where('created_at', '>=', which.since)
    .count({ count: '*' });
  return Number(row?.['count'] ?? 0);
}

/** The template of a message; null where there is none, or its words have been let go. */
export async function findTemplateOf(scope: ShopScope, id: string | null): Promise<string | null> {
  if (id === null) return null;
  const row: unknown = await scope.db('messages').where({ shop_id: scope.shopId, id }).first('template');
  return row ? z.object({ template: z.string() }).parse(row).template : null;
}

/** Whether a person was sent a message of one of these kinds about a trial. */
export async function hadMessage(
  scope: ShopScope,
  which: { templates: readonly string[]; trialId: string; personId: string },
): Promise<boolean> {
  const found = await scope
    .db('messages')
    .where({ shop_id: scope.shopId, trial_id: which.trialId, person_id: which.personId })
    .whereIn('template', [...which.templates])
    .first('id');
  return found !== undefined;
}
