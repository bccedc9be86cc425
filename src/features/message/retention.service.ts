import type { Knex } from 'knex';
import { now } from '../../server/clock.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';
import { findAddressee, suppressPhone } from './addressee.repository.ts';
import { moveConversation } from './conversation.repository.ts';
import {
  blankWordsBefore,
  blankWordsOfPerson,
  listRetentionRules,
  removeStrangersBefore,
} from './retention.repository.ts';
import { workerScope } from './sending.service.ts';

const day = 24 * 60 * 60_000;
const strangersDays = 30;

/**
 * Lets go of words whose time is over: each shop's own number of days, and 30 for unknown senders.
 * @returns how many texts and mails lost their words
 */
export async function forgetOldWords(db: Knex): Promise<number> {
  const at = now();
  let forgotten = 0;
  for (const { shopId, days } of await listRetentionRules(db)) {
    forgotten += await inTransaction(workerScope(db, shopId), async (scope) => {
      const blanked = await blankWordsBefore(scope, at - days * day);
      return blanked + (await removeStrangersBefore(scope, at - strangersDays * day));
    });
  }
  return forgotten;
}

/**
 * The text part of erasing a person: their words go, what waits for them is dropped, and an opt-out stays with the
 * number. Call it in the transaction of the erasure, while the person still has the number.
 */
export async function forgetTextsOfPerson(scope: ShopScope, personId: string): Promise<void> {
  const person = await findAddressee(scope, personId);
  if (person?.consent === 'opted out' && person.phone !== null) {
    await suppressPhone(scope, { id: newId(), phone: person.phone, at: now() });
  }
  await blankWordsOfPerson(scope, personId);
  await moveConversation(scope, { id: newId(), personId, state: 'unasked' });
}
