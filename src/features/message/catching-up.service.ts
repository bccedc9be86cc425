import type { Knex } from 'knex';
import { listTextNumbers } from '../../server/auth/text-number.ts';
import { now } from '../../server/clock.ts';
import { readAppState, writeAppState } from '../../server/db/app-state.ts';
import { keepReceivedText } from './inbox.service.ts';
import type { TextGateway } from './text-gateway.ts';

const minute = 60_000;
/** Looked at again each time, since a text may enter the service's list after others that came later. */
const overlapMilliseconds = 10 * minute;
/** How far the first look goes back. */
const firstLookMilliseconds = 24 * 60 * minute;

/**
 * Finds texts that the service received and that no webhook told us of, and keeps them.
 * @returns how many were new
 */
export async function catchUpTexts(db: Knex, gateway: TextGateway): Promise<number> {
  let added = 0;
  for (const { scope, number } of await listTextNumbers(db)) {
    const key = `texts-caught-up:${scope.shopId}`;
    const startedAt = now();
    const before = await readAppState(db, key);
    const caughtUpTo = before === null ? startedAt - firstLookMilliseconds : Number(before);
    const since = Math.min(caughtUpTo, startedAt) - overlapMilliseconds;
    const listing = await gateway.listReceived({ to: number, since });
    if (listing.outcome !== 'listed') continue;
    const inOrder = [...listing.texts].reverse().sort((one, other) => one.sentAt - other.sentAt);
    for (const { providerId, from, body, sentAt, mediaCount } of inOrder) {
      const media = { items: [], unlisted: mediaCount };
      if (await keepReceivedText(scope, { providerId, from, body, media, sentAt })) added += 1;
    }
    await writeAppState(db, key, String(startedAt));
  }
  return added;
}
