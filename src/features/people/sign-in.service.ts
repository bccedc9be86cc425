import { checkPassword } from '../../server/auth/password.ts';
import { countSignInTry, forgetSignInTries } from '../../server/auth/rate-limits.ts';
import { endSession, type SessionCookie, startSession } from '../../server/auth/session.ts';
import { findByAddress, scopeOfPerson } from '../../server/auth/sign-in-address.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import type { Browser } from '../../server/http/browser.ts';

/**
 * Starts a session under a new id, ends the one this browser had before, and records it; in the transaction that `scope`
 * holds.
 */
export async function openSession(
  scope: ShopScope,
  personId: string,
  browser: Browser,
): Promise<SessionCookie> {
  if (browser.oldSessionId) await endSession(scope, browser.oldSessionId);
  const { cookie, handle } = await startSession(scope, { personId, userAgent: browser.userAgent });
  await recordActivity(scope, {
    kind: 'session.started',
    subjectId: personId,
    details: { session: handle },
  });
  return cookie;
}

/**
 * Signs in by mail address and password.
 * @returns null when they do not go together, alike and as fast whether the address exists or not
 * @throws AppError `too-many`
 */
export async function signIn(
  attempt: { email: string; password: string; network: string },
  browser: Browser,
): Promise<SessionCookie | null> {
  const who = { address: attempt.email, network: attempt.network };
  await countSignInTry(who);
  const person = await findByAddress(attempt.email);
  const matches = await checkPassword(person?.passwordHash ?? null, attempt.password);
  if (!person || !matches) return null;
  await forgetSignInTries(who);
  return inTransaction(scopeOfPerson(person), (scope) => openSession(scope, person.personId, browser));
}
