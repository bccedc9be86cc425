import type { Knex } from 'knex';
import { z } from 'zod';
import { jsonColumn, moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';

export interface InboxMedia {
  items: { url: string; type: string }[];
  /** Pictures that came with the text but whose addresses are not known yet. */
  unlisted: number;
}

export interface NewInboxText {
  id: string;
  providerId: string;
  personId: string | null;
  /** Kept only while the sender is unknown. */
  fromPhone: string | null;
  body: string;
  media: InboxMedia;
  sentAt: number;
  receivedAt: number;
}

/** @returns false when the same text is there already */
export async function insertInboxText(scope: ShopScope, text: NewInboxText): Promise<boolean> {
  const added = await scope
    .db('inbox_texts')
    .insert({
      id: text.id,
      shop_id: scope.shopId,
      provider_id: text.providerId,
      person_id: text.personId,
      from_phone: text.fromPhone,
      body: text.body,
      media: JSON.stringify({ v: 1, ...text.media }),
      sent_at: text.sentAt,
      received_at: text.receivedAt,
      state: 'new',
      photo_state: text.media.items.length + text.media.unlisted > 0 ? 'waiting' : 'none',
    })
    .onConflict('provider_id')
    .ignore()
    .returning('id');
  return added.length > 0;
}

const mediaSchema = z.object({
  items: z.array(z.object({ url: z.string(), type: z.string() })),
  unlisted: z.number().default(0),
});

const rowSchema = z
  .object({
    id: z.string(),
    shop_id: z.string(),
    provider_id: z.string(),
    person_id: z.string().nullable(),
    run_id: z.string().nullable(),
    media: jsonColumn(mediaSchema),
    photo_attempts: z.number(),
    from_phone: z.string().nullable(),
    body: z.string(),
    sent_at: moment,
    attempts: z.number(),
  })
  .transform((row) => ({
    id: row.id,
    shopId: row.shop_id,
    providerId: row.provider_id,
    runId: row.run_id,
    media: row.media,
    photoAttempts: row.photo_attempts,
    personId: row.person_id,
    fromPhone: row.from_phone,
    body: row.body,
    sentAt: row.sent_at,
    attempts: row.attempts,
  }));
export type InboxText = z.output<typeof rowSchema>;

/** Texts that nobody has read yet, in the order the service had them. */
export async function listNewInboxTexts(db: Knex, limit: number): Promise<InboxText[]> {
  const rows = await db('inbox_texts').where({ state: 'new' }).orderBy(['sent_at', 'id']).limit(limit);
  return z.array(rowSchema).parse(rows);
}

/**
 * Takes a new text off the pile.
 * @param result `read`, or `set aside` for what nothing could be made of; the text itself stays
 * @returns false when somebody else did
 */
export async function closeInboxText(
  scope: ShopScope,
  id: string,
  result: { state: 'read' | 'set aside'; intent: string | null },
): Promise<boolean> {
  const changed = await scope
    .db('inbox_texts')
    .where({ shop_id: scope.shopId, id, state: 'new' })
    .update(result);
  return changed > 0;
}

/** Says what was made of a text that is off the pile. */
export async function describeInboxText(
  scope: ShopScope,
  id: string,
  result: { state: 'read' | 'set aside'; intent: string; runId: string | null },
): Promise<void> {
  await scope
    .db('inbox_texts')
    .where({ shop_id: scope.shopId, id })
    .update({ state: result.state, intent: result.intent, run_id: result.runId });
}

/** Notes an attempt to read that failed. */
export async function countReadingAttempt(scope: ShopScope, id: string): Promise<void> {
  await scope.db('inbox_texts').where({ shop_id: scope.shopId, id }).increment('attempts', 1);
}

/** Texts that were read and whose pictures are still to be fetched, oldest first. */
export async function listTextsWithPhotos(db: Knex, at: number, limit: number): Promise<InboxText[]> {
  const rows = await db('inbox_texts')
    .where({ photo_state: 'waiting' })
    .whereNot({ state: 'new' })
    .where('photo_not_before', '<=', at)
    .orderBy('id')
    .limit(limit);
  return z.array(rowSchema).parse(rows);
}

/** What became of the pictures of a text, or when they are asked for again. */
export async function notePhotos(
  scope: ShopScope,
  id: string,
  result: { state: 'kept' | 'failed' } | { state: 'waiting'; notBefore: number },
): Promise<void> {
  const again = result.state === 'waiting' ? { photo_not_before: result.notBefore } : {};
  await scope
    .db('inbox_texts')
    .where({ shop_id: scope.shopId, id })
    .update({
      photo_state: result.state,
      photo_attempts: scope.db.raw('photo_attempts + 1'),
      ...again,
    });
}
