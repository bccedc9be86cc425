import { now } from '../../server/clock.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';
import { suppressPhone } from './addressee.repository.ts';
import { changeConsent } from './consent.repository.ts';
import { moveConversation } from './conversation.repository.ts';
import { cancelWaitingMessages } from './message.repository.ts';

/**
 * Ends texts to a person: at once, for every text that still waits, and for the number itself, whoever holds it later.
 * Call it in a transaction.
 * @param person.how `text` when they texted STOP, `service` when the text service refused to send
 */
export async function withdrawConsent(
  scope: ShopScope,
  person: { personId: string; phone: string; how: 'text' | 'service' },
): Promise<void> {
  const { personId, phone, how } = person;
  const at = now();
  await changeConsent(scope, personId, { consent: 'opted out', at, how }, at);
  await suppressPhone(scope, { id: newId(), phone, at });
  await cancelWaitingMessages(scope, personId, ['text']);
  await moveConversation(scope, { id: newId(), personId, state: 'left' });
  await recordActivity(scope, { kind: 'consent.withdrawn', subjectId: personId, details: { how } });
}
