import { z } from 'zod';
import { now } from '../clock.ts';
import { moment } from '../db/columns.ts';
import { database } from '../db/connection.ts';
import type { ShopScope } from '../db/scope.ts';

const sessionRow = z.object({
  handle: z.string(),
  device: z.string(),
  created_at: moment,
  last_seen_at: moment,
  expires_at: moment,
});

/** One place where a person is signed in, as that person may see it. */
export interface ListedSession {
  handle: string;
  device: string;
  createdAt: number;
  lastSeenAt: number;
  expiresAt: number;
}

/** The person's live sessions, the one used last on top. */
export async function listSessions(scope: ShopScope, personId: string): Promise<ListedSession[]> {
  const rows = await scope
    .db('sessions')
    .where({ shop_id: scope.shopId, person_id: personId })
    .where('expires_at', '>', now())
    .orderBy([
      { column: 'last_seen_at', order: 'desc' },
      { column: 'id', order: 'desc' },
    ]);
  return z
    .array(sessionRow)
    .parse(rows)
    .map((row) => ({
      handle: row.handle,
      device: row.device,
      createdAt: row.created_at,
      lastSeenAt: row.last_seen_at,
      expiresAt: row.expires_at,
    }));
}

/** Ends one session of this person by its handle. @returns whether there was one */
export async function endListedSession(
  scope: ShopScope,
  session: { personId: string; handle: string },
): Promise<boolean> {
  const ended = await scope
    .db('sessions')
    .where({ shop_id: scope.shopId, person_id: session.personId, handle: session.handle })
    .delete();
  return ended > 0;
}

/** Ends all sessions of the person but the one named. */
export async function endOtherSessions(
  scope: ShopScope,
  session: { personId: string; keep: string },
): Promise<number> {
  return scope
    .db('sessions')
    .where({ shop_id: scope.shopId, person_id: session.personId })
    .whereNot({ handle: session.keep })
    .delete();
}

const seenEvery = 300_000;

/** Keeps "last seen" true to five minutes, so that reading a page does not cost a write each time. */
export async function noteSessionSeen(session: { handle: string; lastSeenAt: number }): Promise<void> {
  if (now() - session.lastSeenAt < seenEvery) return;
  await database()('sessions').where({ handle: session.handle }).update({ last_seen_at: now() });
}
