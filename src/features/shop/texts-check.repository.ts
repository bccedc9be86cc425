import { z } from 'zod';
import { moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import type { CheckAnswer, CheckedText } from './texts-check.ts';

const textRow = z.object({
  state: z.enum(['waiting', 'sending', 'unsure', 'sent', 'delivered', 'failed', 'cancelled']),
  created_at: moment,
  not_before: moment,
  sent_at: moment.nullable(),
  provider_status: z.enum(['accepted', 'sent', 'delivered', 'undelivered']).nullable(),
  error_code: z.string().nullable(),
});

/** The newest text that can serve as a check for this person: the check itself, or the question they are to answer. */
export async function findCheckText(scope: ShopScope, personId: string): Promise<CheckedText | null> {
  const found: unknown = await scope
    .db('messages')
    .where({ shop_id: scope.shopId, person_id: personId, channel: 'text' })
    .whereIn('template', ['textsCheck', 'consent'])
    .orderBy('created_at', 'desc')
    .orderBy('id', 'desc')
    .first();
  if (!found) return null;
  const row = textRow.parse(found);
  return {
    state: row.state,
    createdAt: row.created_at,
    notBefore: row.not_before,
    sentAt: row.sent_at,
    providerStatus: row.provider_status,
    errorCode: row.error_code,
  };
}

const answerRow = z.object({ sent_at: moment, received_at: moment });

/** The first text that this person sent since a moment. */
export async function findAnswerSince(
  scope: ShopScope,
  personId: string,
  since: number,
): Promise<CheckAnswer | null> {
  const found: unknown = await scope
    .db('inbox_texts')
    .where({ shop_id: scope.shopId, person_id: personId })
    .where('received_at', '>=', since)
    .orderBy('received_at')
    .first('sent_at', 'received_at');
  if (!found) return null;
  const row = answerRow.parse(found);
  return { sentAt: row.sent_at, receivedAt: row.received_at };
}
