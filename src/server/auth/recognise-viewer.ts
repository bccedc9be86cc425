import type { APIContext } from 'astro';
import { AppError } from '../errors.ts';
import { viewerOfToken } from './api-tokens.ts';
import { countTry } from './rate-limits.ts';
import { readSession, sessionCookieName } from './session.ts';
import { noteSessionSeen } from './session-list.ts';
import { hashToken } from './token.ts';
import { rolesOfPerson, type Viewer } from './viewer.ts';

const readingMethods = ['GET', 'HEAD'];

/** Tokens are for programs that read: they open nothing but GET on the API. */
async function viewerByToken(context: APIContext, header: string): Promise<Viewer> {
  const token = /^Bearer +([\w-]+)$/i.exec(header)?.[1];
  if (!token) throw new AppError('not-signed-in', { detail: 'not a bearer token' });
  await countTry('token', hashToken(token));
  const viewer = await viewerOfToken(token);
  if (!viewer) throw new AppError('not-signed-in', { detail: 'dead token' });
  if (!readingMethods.includes(context.request.method)) {
    throw new AppError('forbidden', { detail: 'tokens only read' });
  }
  return viewer;
}

async function viewerBySession(context: APIContext, sessionId: string): Promise<Viewer | null> {
  const { session, user, cookie } = await readSession(sessionId);
  if (cookie) context.cookies.set(cookie.name, cookie.value, cookie.attributes);
  if (!session) return null;
  await noteSessionSeen(session);
  const { id, shopId, shopName, timeZone, name, language, theme } = user;
  return {
    personId: id,
    shopId,
    shopName,
    timeZone,
    name,
    language,
    theme,
    roles: await rolesOfPerson(shopId, id),
    sessionHandle: session.handle,
  };
}

/**
 * Who is asking: on the API by a bearer token if one is sent, else by the session cookie.
 * @throws AppError when a token is sent that is dead, over its limit, or used for more than reading
 */
export async function recogniseViewer(context: APIContext): Promise<Viewer | null> {
  const authorization = context.request.headers.get('authorization');
  if (authorization !== null && context.url.pathname.startsWith('/api/')) {
    return viewerByToken(context, authorization);
  }
  const sessionId = context.cookies.get(sessionCookieName)?.value;
  return sessionId ? viewerBySession(context, sessionId) : null;
}
