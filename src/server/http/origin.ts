import { config } from '../env.ts';

/** The two addresses that no browser posts to: their senders sign what they send, and the endpoints check it. */
const signedPaths = ['/api/texts/inbound', '/api/texts/status'];
const readingMethods = ['GET', 'HEAD', 'OPTIONS'];

/**
 * Whether a request that may change something comes from our own pages. Browsers send `Origin` with every such request;
 * one without it is no browser showing our page.
 */
export function isFromOurPages(request: Request, path: string): boolean {
  if (readingMethods.includes(request.method) || signedPaths.includes(path)) return true;
  return request.headers.get('origin') === new URL(config().appUrl).origin;
}
