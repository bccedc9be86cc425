import type { Knex } from 'knex';
import { Lucia, TimeSpan } from 'lucia';
import { now } from '../clock.ts';
import { database } from '../db/connection.ts';
import type { ShopScope } from '../db/scope.ts';
import { config } from '../env.ts';
import { newId } from '../ids.ts';
import { HashedSessionAdapter } from './session-adapter.ts';

// lucia is no longer developed: nothing outside this file and its adapter knows it, so that it can be replaced here.

declare module 'lucia' {
  interface Register {
    Lucia: typeof lucia;
  }
}

function luciaOn(db: () => Knex) {
  return new Lucia(new HashedSessionAdapter(db), {
    sessionExpiresIn: new TimeSpan(2, 'w'),
    sessionCookie: {
      name: 'session',
      attributes: { secure: config().appUrl.startsWith('https://'), sameSite: 'lax', path: '/' },
    },
    getSessionAttributes: ({ shopId, handle, lastSeenAt }) => ({ shopId, handle, lastSeenAt }),
    getUserAttributes: ({ shopId, shopName, timeZone, name, language, theme }) => ({
      shopId,
      shopName,
      timeZone,
      name,
      language,
      theme,
    }),
  });
}

const lucia = luciaOn(database);

export const sessionCookieName = lucia.sessionCookieName;

/** A cookie to set with an answer. */
export type SessionCookie = ReturnType<typeof lucia.createSessionCookie>;

/** A browser's self-description, cut to what helps a person to recognise it in a list. */
export function describeDevice(userAgent: string | null): string {
  return (userAgent ?? '').replace(/[^\x20-\x7e]/g, '').slice(0, 160);
}

/** Starts a session with a new id, in the transaction that `scope` holds if any, and gives the cookie that carries it. */
export async function startSession(
  scope: ShopScope,
  person: { personId: string; userAgent: string | null },
): Promise<{ cookie: SessionCookie; handle: string }> {
  const handle = newId();
  const session = await luciaOn(() => scope.db).createSession(person.personId, {
    shopId: scope.shopId,
    handle,
    device: describeDevice(person.userAgent),
    lastSeenAt: now(),
  });
  return { cookie: lucia.createSessionCookie(session.id), handle };
}

/** The session and person behind a cookie, and the cookie to set: renewed past half of its life, blank when it is dead. */
export async function readSession(sessionId: string) {
  const { session, user } = await lucia.validateSession(sessionId);
  if (!session) return { session: null, user: null, cookie: lucia.createBlankSessionCookie() };
  return { session, user, cookie: session.fresh ? lucia.createSessionCookie(session.id) : null };
}

/** Ends the session of a cookie, whoever's it is, and gives the blank cookie. */
export async function endSession(scope: { db: Knex }, sessionId: string): Promise<SessionCookie> {
  await luciaOn(() => scope.db).invalidateSession(sessionId);
  return lucia.createBlankSessionCookie();
}

/**
 * Ends every session of a person, in the transaction that `scope` holds if any: after a new password, changed roles,
 * deactivation, or "sign out everywhere".
 */
export async function endAllSessions(scope: ShopScope, personId: string): Promise<void> {
  await luciaOn(() => scope.db).invalidateUserSessions(personId);
}
