import type { Knex } from 'knex';
import { z } from 'zod';
import type { ShopScope } from '../../server/db/scope.ts';
import { readMessages, type StoredMessage } from './message.repository.ts';
import type { Channel } from './message.ts';

const dueShopRow = z.object({ id: z.string(), text_number: z.string().nullable() });

/** Shops that have something to send now. Texts wait while the shop has no number. */
export async function listShopsWithDue(
  db: Knex,
  channel: Channel,
  at: number,
): Promise<{ shopId: string; textNumber: string | null }[]> {
  const due = db('messages')
    .where({ channel, state: 'waiting' })
    .where('not_before', '<=', at)
    .select('shop_id');
  const shops = db('shops').whereIn('id', due).orderBy('id').select('id', 'text_number');
  if (channel === 'text') shops.whereNotNull('text_number');
  return z
    .array(dueShopRow)
    .parse(await shops)
    .map(({ id, text_number }) => ({ shopId: id, textNumber: text_number }));
}

/** The next message of a shop: urgent ones first, then in the order they were written. */
export async function findNextDue(
  scope: ShopScope,
  channel: Channel,
  at: number,
): Promise<StoredMessage | null> {
  const rows = await scope
    .db('messages')
    .where({ shop_id: scope.shopId, channel, state: 'waiting' })
    .where('not_before', '<=', at)
    .orderBy([{ column: 'urgent', order: 'desc' }, 'created_at', 'id'])
    .limit(1);
  return readMessages(rows)[0] ?? null;
}

/**
 * Claims a message for one attempt. The state stands in the condition a second time, because another worker may have
 * claimed the row between the inner look and this write.
 * @returns null when somebody else has it
 */
export async function claimMessage(
  scope: ShopScope,
  id: string,
  lease: { by: string; at: number; until: number },
): Promise<StoredMessage | null> {
  const { db, shopId } = scope;
  const waiting = db('messages').where({ shop_id: shopId, id, state: 'waiting' }).select('id');
  const rows = await db('messages')
    .whereIn('id', waiting)
    .andWhere({ state: 'waiting' })
    .update({
      state: 'sending',
      attempts: db.raw('attempts + 1'),
      first_attempt_at: db.raw('coalesce(first_attempt_at, ?)', [lease.at]),
      lease_until: lease.until,
      lease_by: lease.by,
    })
    .returning('*');
  return readMessages(rows)[0] ?? null;
}

/** Messages whose attempt was never finished: the worker that made it is gone, or its clock ran ahead. */
export async function listLapsed(db: Knex, at: number): Promise<StoredMessage[]> {
  const rows = await db('messages').where({ state: 'sending' }).where('lease_until', '<', at).limit(100);
  return readMessages(rows);
}

/** Texts whose fate the service's list must tell, oldest first, with the number they were sent from. */
export async function listUnsure(db: Knex): Promise<{ message: StoredMessage; textNumber: string }[]> {
  const rows = readMessages(await db('messages').where({ state: 'unsure' }).orderBy('created_at').limit(100));
  const numbers: unknown[] = await db('shops')
    .whereIn('id', [...new Set(rows.map(({ shopId }) => shopId))])
    .select('id', 'text_number');
  const numberOf = new Map(
    z
      .array(dueShopRow)
      .parse(numbers)
      .map(({ id, text_number }) => [id, text_number]),
  );
  return rows.flatMap((message) => {
    const textNumber = numberOf.get(message.shopId);
    return textNumber ? [{ message, textNumber }] : [];
  });
}
