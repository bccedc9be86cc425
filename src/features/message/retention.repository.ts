import type { Knex } from 'knex';
import { z } from 'zod';
import type { ShopScope } from '../../server/db/scope.ts';
import { blankColumns } from './message.repository.ts';

const shopRow = z.object({ id: z.string(), keep_texts_days: z.number() });

export async function listRetentionRules(db: Knex): Promise<{ shopId: string; days: number }[]> {
  const rows = await db('shops').orderBy('id').select('id', 'keep_texts_days');
  return z
    .array(shopRow)
    .parse(rows)
    .map(({ id, keep_texts_days }) => ({ shopId: id, days: keep_texts_days }));
}

/**
 * Blanks the words of texts and mails: of a trial when it was closed before `until`, of no trial when they were written
 * before it. Rows and figures stay.
 */
export async function blankWordsBefore(scope: ShopScope, until: number): Promise<number> {
  const { db, shopId } = scope;
  const closed = db('trials').where({ shop_id: shopId, state: 'closed' }).where('updated_at', '<', until);
  const messages = await db('messages')
    .where({ shop_id: shopId })
    .whereNot({ body: '' })
    .whereIn('state', ['sent', 'delivered', 'failed', 'cancelled'])
    .andWhere((old) =>
      old
        .whereIn('trial_id', closed.clone().select('id'))
        .orWhere((loose) => loose.whereNull('trial_id').where('created_at', '<', until)),
    )
    .update({ ...blankColumns, recipient: '' });
  const runs = db('runs').where({ shop_id: shopId }).whereIn('trial_id', closed.clone().select('id'));
  const texts = await db('inbox_texts')
    .where({ shop_id: shopId })
    .whereNot({ body: '' })
    .whereNot({ state: 'new' })
    .whereNotNull('person_id')
    .andWhere((old) =>
      old
        .whereIn('run_id', runs.select('id'))
        .orWhere((loose) => loose.whereNull('run_id').where('received_at', '<', until)),
    )
    .update({ body: '' });
  return messages + texts;
}

/** Removes what unknown senders wrote before `until`. */
export async function removeStrangersBefore(scope: ShopScope, until: number): Promise<number> {
  return scope
    .db('inbox_texts')
    .where({ shop_id: scope.shopId })
    .whereNull('person_id')
    .where('received_at', '<', until)
    .delete();
}

/** Blanks every word to and from a person, whatever its age, and drops what still waits for them. */
export async function blankWordsOfPerson(scope: ShopScope, personId: string): Promise<void> {
  const { db, shopId } = scope;
  const own = { shop_id: shopId, person_id: personId };
  await db('messages').where(own).where({ state: 'waiting' }).update({ state: 'cancelled' });
  await db('messages')
    .where(own)
    .update({ ...blankColumns, recipient: '' });
  await db('inbox_texts').where(own).update({ body: '', media: '{"v":1,"items":[],"unlisted":0}' });
}
