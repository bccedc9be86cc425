import { openLink, scopeOfLink, takeLink } from '../../server/auth/links.ts';
import { countTry } from '../../server/auth/rate-limits.ts';
import { endAllSessions, type SessionCookie } from '../../server/auth/session.ts';
import { findByPerson, type SignInPerson } from '../../server/auth/sign-in-address.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import { AppError } from '../../server/errors.ts';
import type { Browser } from '../../server/http/browser.ts';
import { prepareNewPassword, replacePassword } from './password.service.ts';
import { openSession } from './sign-in.service.ts';

/** The two links that let a person choose a password: an invitation, and a mail after "forgotten". */
export type PasswordLink = 'invite' | 'reset';

const recordedAs = { invite: 'invitation.accepted', reset: 'password.reset' } as const;

async function openPasswordLink(visit: { token: string; network: string }, purpose: PasswordLink) {
  await countTry('link', visit.network);
  const link = await openLink(visit.token, purpose);
  const person = await findByPerson(link);
  if (!person) throw new AppError('gone');
  return { link, person };
}

/**
 * Whose password the link lets one choose. Looking does not use the link up.
 * @throws AppError `gone`, or `too-many` visits from this network
 */
export async function readPasswordLink(
  visit: { token: string; network: string },
  purpose: PasswordLink,
): Promise<Pick<SignInPerson, 'shopName' | 'email'>> {
  const { person } = await openPasswordLink(visit, purpose);
  return { shopName: person.shopName, email: person.email };
}

/**
 * Uses the link: keeps the new password, ends all sessions there were, and signs the person in here.
 * @throws AppError `gone`, `invalid` (the link can then be used again), `too-many`
 */
export async function choosePasswordByLink(
  visit: { token: string; network: string; password: string },
  purpose: PasswordLink,
  browser: Browser,
): Promise<SessionCookie> {
  const { link, person } = await openPasswordLink(visit, purpose);
  const passwordHash = await prepareNewPassword(visit.password, person);
  const { personId } = person;
  return inTransaction(scopeOfLink(link), async (scope) => {
    await takeLink(scope, link);
    await replacePassword(scope, { personId, passwordHash });
    await endAllSessions(scope, personId);
    await recordActivity(scope, { kind: recordedAs[purpose], subjectId: personId });
    return openSession(scope, personId, browser);
  });
}
