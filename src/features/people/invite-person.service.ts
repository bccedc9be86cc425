import { createLink, revokeLinks } from '../../server/auth/links.ts';
import { countTry } from '../../server/auth/rate-limits.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { config } from '../../server/env.ts';
import { AppError } from '../../server/errors.ts';
import { askForConsent } from '../message/consent.service.ts';
import { queueMessage } from '../message/message.service.ts';
import { findShop } from '../shop/shop.repository.ts';
import { findPersonInReach } from './find-person.service.ts';
import { findPerson } from './person.repository.ts';
import { type InvitationWay, invitationWays, type Person } from './person.ts';
import type { PeopleReader } from './reach.ts';

const daysToAccept = 7;

async function inviteByMail(scope: ShopScope, person: Person, inviter: string): Promise<void> {
  // An older invitation ends with the new one: only the newest mail opens the door.
  await revokeLinks(scope, { purpose: 'invite', personId: person.id });
  const { id, token } = await createLink(scope, { purpose: 'invite', personId: person.id });
  const shop = await findShop(scope);
  await queueMessage(scope, {
    template: 'invitation',
    params: {
      shop: shop.name,
      inviter,
      link: `${config().appUrl}/invite/${token}`,
      days: daysToAccept,
    },
    personId: person.id,
    dedupe: `invitation:${id}`,
  });
}

/** Invites by every way that is open, in the transaction at hand. @returns the ways that were taken */
export async function inviteWithin(scope: ShopScope, person: Person): Promise<InvitationWay[]> {
  const inviter =
    scope.actor.kind === 'person' && scope.actor.id ? await findPerson(scope, scope.actor.id) : null;
  if (!inviter) throw new RangeError('inviteWithin: scope.actor is not a person of the shop');
  const ways = invitationWays(person);
  for (const way of ways) {
    if (way === 'mail') await inviteByMail(scope, person, inviter.name);
    else await askForConsent(scope, person.id, { id: inviter.id, name: inviter.name });
  }
  if (ways.length > 0) {
    await recordActivity(scope, { kind: 'person.invited', subjectId: person.id, details: { ways } });
  }
  return ways;
}

/**
 * Invites somebody: a mail to choose a password, a text that asks for consent, or both.
 * @throws AppError `not-now` when no way is open, `too-many` after five an hour
 */
export async function invitePerson(
  scope: ShopScope,
  id: string,
  reader: PeopleReader,
): Promise<{ person: Person; ways: InvitationWay[] }> {
  const known = await findPersonInReach(scope, id, reader);
  if (invitationWays(known).length === 0) throw new AppError('not-now', { detail: 'no way to invite' });
  await countTry('invite', scope.shopId, id);
  return inTransaction(scope, async (inner) => {
    const ways = await inviteWithin(inner, await findPersonInReach(inner, id, reader));
    return { person: await findPersonInReach(inner, id, reader), ways };
  });
}
