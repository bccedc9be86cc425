import type { APIContext } from 'astro';
import { config } from '../env.ts';

const cookieName = 'shown-once';
const seconds = 60;

/**
 * Hands a secret to the page that the answer to a form leads to, so that it is in no address and a reload makes no second
 * one. It lives in the reader's own browser for a minute at most, where no script can read it.
 */
export function passOnce(context: Pick<APIContext, 'cookies' | 'url'>, secret: string): void {
  context.cookies.set(cookieName, secret, {
    path: context.url.pathname,
    maxAge: seconds,
    httpOnly: true,
    sameSite: 'strict',
    secure: config().appUrl.startsWith('https://'),
  });
}

/** The secret that was handed over, taken away as it is read. */
export function takePassed(context: Pick<APIContext, 'cookies' | 'url'>): string | null {
  const secret = context.cookies.get(cookieName)?.value ?? null;
  if (secret !== null) context.cookies.delete(cookieName, { path: context.url.pathname });
  return secret;
}
