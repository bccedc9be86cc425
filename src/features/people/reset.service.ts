import { setTimeout as pause } from 'node:timers/promises';
import { createLink, linkLifetimes } from '../../server/auth/links.ts';
import { countTry } from '../../server/auth/rate-limits.ts';
import { findByAddress, type SignInPerson, scopeOfPerson } from '../../server/auth/sign-in-address.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { config } from '../../server/env.ts';
import { queueMessage } from '../message/message.service.ts';

const minute = 60_000;
/** The answer takes this long with or without a mail to write, so that its time says nothing; in milliseconds. */
const answerTakes = 250;

async function mailResetLink(person: SignInPerson): Promise<void> {
  const { personId } = person;
  // Whoever asked is not known yet: not the person, as far as the log can say.
  const asked: ShopScope = { ...scopeOfPerson(person), actor: { kind: 'service', id: null } };
  await inTransaction(asked, async (scope) => {
    const { id, token } = await createLink(scope, { purpose: 'reset', personId });
    await queueMessage(scope, {
      template: 'reset',
      params: { link: `${config().appUrl}/reset/${token}`, minutes: linkLifetimes.reset / minute },
      personId,
      dedupe: `reset:${id}`,
    });
    await recordActivity(scope, { kind: 'reset.asked', subjectId: personId });
  });
}

/**
 * Mails a link to choose a new password, if somebody signs in with this address. The answer is the same, and takes as
 * long, if nobody does.
 * @throws AppError `too-many`: more than five an hour for this address, or too many from this network
 */
export async function requestReset(wish: { email: string; network: string }): Promise<void> {
  await countTry('link', wish.network);
  await countTry('reset', wish.email);
  const answer = pause(answerTakes);
  const person = await findByAddress(wish.email);
  if (person) await mailResetLink(person);
  await answer;
}
