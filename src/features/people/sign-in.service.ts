import { checkPassword } from '../../server/auth/password.ts';
import { countSignInTry, forgetSignInTries } from '../../server/auth/rate-limits.ts';
import { endSession, type SessionCookie, startSession } from '../../server/auth/session.ts';
import { findByAddress, type SignInPerson, scopeOfPerson } from '../../server/auth/sign-in-address.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';

/** The browser that a person signs in with. */
export interface Browser {
  userAgent: string | null;
  /** The session it had before, if any: signing in ends it. */
  oldSessionId: string | undefined;
}

/** Starts a session under a new id and records it, in the transaction that `scope` holds. */
export async function openSession(
  scope: ShopScope,
  person: { personId: string; userAgent: string | null },
): Promise<SessionCookie> {
  const { cookie, handle } = await startSession(scope, person);
  await recordActivity(scope, {
    kind: 'session.started',
    subjectId: person.personId,
    details: { session: handle },
  });
  return cookie;
}

/** Signs in a person who has shown who they are. */
export async function signInPerson(
  person: Pick<SignInPerson, 'shopId' | 'personId'>,
  browser: Browser,
): Promise<SessionCookie> {
  if (browser.oldSessionId) await endSession(browser.oldSessionId);
  return inTransaction(scopeOfPerson(person), (scope) =>
    openSession(scope, { personId: person.personId, userAgent: browser.userAgent }),
  );
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
  return signInPerson(person, browser);
}
