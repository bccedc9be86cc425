import type { APIContext } from 'astro';
import { sessionCookieName } from '../auth/session.ts';

/** The browser that a person signs in with. */
export interface Browser {
  userAgent: string | null;
  /** The session it had before, if any: signing in ends it. */
  oldSessionId: string | undefined;
}

/** What a sign-in needs to know of the browser that sends a request. */
export function browserOf(context: Pick<APIContext, 'request' | 'cookies'>): Browser {
  return {
    userAgent: context.request.headers.get('user-agent'),
    oldSessionId: context.cookies.get(sessionCookieName)?.value,
  };
}
