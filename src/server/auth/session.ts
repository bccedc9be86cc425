import { Lucia, TimeSpan } from 'lucia';
import { config } from '../env.ts';
import { newId } from '../ids.ts';
import { HashedSessionAdapter } from './session-adapter.ts';

// lucia is no longer developed: nothing outside this file and its adapter knows it, so that it can be replaced here.

declare module 'lucia' {
  interface Register {
    Lucia: typeof lucia;
  }
}

const lucia = new Lucia(new HashedSessionAdapter(), {
  sessionExpiresIn: new TimeSpan(2, 'w'),
  sessionCookie: {
    name: 'session',
    attributes: { secure: config().appUrl.startsWith('https://'), sameSite: 'lax', path: '/' },
  },
  getSessionAttributes: ({ shopId, handle }) => ({ shopId, handle }),
  getUserAttributes: ({ shopId, shopName, timeZone, name, language, theme }) => ({
    shopId,
    shopName,
    timeZone,
    name,
    language,
    theme,
  }),
});

export const sessionCookieName = lucia.sessionCookieName;

/** A cookie to set with an answer. */
export type SessionCookie = ReturnType<typeof lucia.createSessionCookie>;

/** A browser's self-description, cut to what helps a person to recognise it in a list. */
export function describeDevice(userAgent: string | null): string {
  return (userAgent ?? '').replace(/[^\x20-\x7e]/g, '').slice(0, 160);
}

/** Starts a session with a new id and gives the cookie that carries it. */
export async function startSession(person: {
  personId: string;
  shopId: string;
  userAgent: string | null;
}): Promise<SessionCookie> {
  const session = await lucia.createSession(person.personId, {
    shopId: person.shopId,
    handle: newId(),
    device: describeDevice(person.userAgent),
  });
  return lucia.createSessionCookie(session.id);
}

/** The session and person behind a cookie, and the cookie to set: renewed past half of its life, blank when it is dead. */
export async function readSession(sessionId: string) {
  const { session, user } = await lucia.validateSession(sessionId);
  if (!session) return { session: null, user: null, cookie: lucia.createBlankSessionCookie() };
  return { session, user, cookie: session.fresh ? lucia.createSessionCookie(session.id) : null };
}

/** Ends one session and gives the blank cookie. */
export async function endSession(sessionId: string): Promise<SessionCookie> {
  await lucia.invalidateSession(sessionId);
  return lucia.createBlankSessionCookie();
}

/** Ends every session of a person: after a new password, changed roles, or "sign out everywhere". */
export async function endAllSessions(personId: string): Promise<void> {
  await lucia.invalidateUserSessions(personId);
}

export async function deleteExpiredSessions(): Promise<void> {
  await lucia.deleteExpiredSessions();
}
