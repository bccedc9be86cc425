import type { Knex } from 'knex';
import { now } from '../../server/clock.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import { recordReport } from './delivery.service.ts';
import { findMessage, knownProviderIds, type StoredMessage } from './message.repository.ts';
import { listUnsure } from './outbox.repository.ts';
import { putOff, workerScope } from './sending.service.ts';
import type { ListedText, TextGateway } from './text-gateway.ts';

/** How far the service's clock and ours may differ: a text overlooked for that reason would go out twice. */
const clockSlackMilliseconds = 10 * 60_000;

/**
 * Settles texts of unknown fate by the service's own list: what it has is sent, what it has not waits for the next
 * attempt. A text is declared missing only after its lease has run out, when no request can still be on its way.
 * @returns how many were settled
 */
export async function settleUnsureTexts(
  db: Knex,
  gateway: TextGateway,
  random: () => number = Math.random,
): Promise<number> {
  let settled = 0;
  for (const { message, textNumber } of await listUnsure(db)) {
    const since = (message.firstAttemptAt ?? now()) - clockSlackMilliseconds;
    const listing = await gateway.listSent({ from: textNumber, to: message.recipient, since });
    if (listing.outcome !== 'listed') continue;
    const found = await findOwnText(db, message, listing.texts);
    const scope = workerScope(db, message.shopId);
    if (found !== undefined) {
      await recordReport(scope, message.id, found);
      settled += 1;
    } else if ((message.leaseUntil ?? 0) < now()) {
      await inTransaction(scope, async (inside) => {
        const current = await findMessage(inside, message.id);
        if (current?.state === 'unsure') await putOff(inside, current, { code: 'missing', random: random() });
      });
      settled += 1;
    }
  }
  return settled;
}

/** The same words may have gone out before on purpose: a text that is known already belongs to another message. */
async function findOwnText(
  db: Knex,
  message: StoredMessage,
  texts: readonly ListedText[],
): Promise<ListedText | undefined> {
  const alike = texts.filter(({ body }) => sameBody(body, message.body));
  const known = await knownProviderIds(
    db,
    alike.map(({ providerId }) => providerId),
  );
  return alike
    .filter(({ providerId }) => !known.has(providerId))
    .sort((one, other) => one.sentAt - other.sentAt)[0];
}

function sameBody(one: string, other: string): boolean {
  const plain = (body: string) => body.replaceAll('\r\n', '\n').trim();
  return plain(one) === plain(other);
}
