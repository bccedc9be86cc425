import type { Knex } from 'knex';
import { now } from '../clock.ts';

const day = 86_400_000;
const keptDays = 30;

/**
 * Deletes what has opened nothing for thirty days: links that were used, revoked or have expired, and sessions; and counts
 * of tries whose time is over.
 * @returns how many rows went
 */
export async function forgetDeadEntries(db: Knex): Promise<number> {
  const at = now();
  const before = at - keptDays * day;
  const links = await db('links')
    .where('expires_at', '<', before)
    .orWhere('used_at', '<', before)
    .orWhere('revoked_at', '<', before)
    .delete();
  const sessions = await db('sessions').where('expires_at', '<', before).delete();
  const counts = await db('rate_limits').where('expire', '<', at).delete();
  return links + sessions + counts;
}
