import { endAllSessions, endSession, type SessionCookie } from '../../server/auth/session.ts';
import {
  endListedSession,
  endOtherSessions,
  type ListedSession,
  listSessions,
} from '../../server/auth/session-list.ts';
import type { Viewer } from '../../server/auth/viewer.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';

/** A place where the person is signed in, and whether it is this one. */
export interface OwnSession extends ListedSession {
  isThisOne: boolean;
}

export async function listOwnSessions(scope: ShopScope, viewer: Viewer): Promise<OwnSession[]> {
  const sessions = await listSessions(scope, viewer.personId);
  return sessions.map((session) => ({ ...session, isThisOne: session.handle === viewer.sessionHandle }));
}

/**
 * Ends one of the person's own sessions.
 * @throws AppError `not-found` when it is not the person's, or has ended already
 */
export async function endOwnSession(scope: ShopScope, viewer: Viewer, handle: string): Promise<void> {
  await inTransaction(scope, async (inner) => {
    const ended = await endListedSession(inner, { personId: viewer.personId, handle });
    if (!ended) throw new AppError('not-found');
    await recordActivity(inner, {
      kind: 'session.ended',
      subjectId: viewer.personId,
      details: { session: handle },
    });
  });
}

/** "Sign out everywhere": this browser too. */
export async function endOwnSessions(scope: ShopScope, viewer: Viewer): Promise<void> {
  await inTransaction(scope, async (inner) => {
    await endAllSessions(inner, viewer.personId);
    await recordActivity(inner, { kind: 'sessions.ended', subjectId: viewer.personId });
  });
}

/** Ends the person's sessions but the one they are using: part of a new password. */
export async function endOwnOtherSessions(scope: ShopScope, viewer: Viewer): Promise<void> {
  const keep = viewer.sessionHandle;
  if (keep === null) throw new RangeError('endOwnOtherSessions: viewer must come with a session');
  await endOtherSessions(scope, { personId: viewer.personId, keep });
}

/** Signs out of this browser and gives the blank cookie. */
export async function endSessionOfBrowser(
  scope: ShopScope,
  viewer: Viewer,
  sessionId: string,
): Promise<SessionCookie> {
  return inTransaction(scope, async (inner) => {
    const cookie = await endSession(inner, sessionId);
    await recordActivity(inner, {
      kind: 'session.ended',
      subjectId: viewer.personId,
      details: { session: viewer.sessionHandle },
    });
    return cookie;
  });
}
