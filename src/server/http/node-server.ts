import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import compression from 'compression';
import sirv from 'sirv';
import { config } from '../env.ts';
import { bodyLimitFor } from '../limits.ts';
import { describeError, log } from '../log.ts';
import { securityHeaders } from './security-headers.ts';

/** Astro's handler. Without a `next` it answers addresses that no page has with the 404 page. */
export type PageHandler = (request: IncomingMessage, response: ServerResponse) => Promise<void>;

const forwardingHeaders = [
  'forwarded',
  'x-forwarded-for',
  'x-forwarded-proto',
  'x-forwarded-host',
  'x-forwarded-port',
];
const aYear = 31_536_000;

function refuse(response: ServerResponse, status: number, code: string): void {
  response.writeHead(status, { 'Content-Type': 'application/problem+json', Connection: 'close' });
  response.end(JSON.stringify({ type: 'about:blank', status, code }));
}

/** Bodies are refused by their declared length before a byte of them is read. */
function bodyRefusal(request: IncomingMessage): [status: number, code: string] | null {
  if (request.headers['transfer-encoding'] !== undefined) return [411, 'length-required'];
  const declared = Number(request.headers['content-length'] ?? 0);
  const path = (request.url ?? '/').split('?')[0] ?? '/';
  return declared > bodyLimitFor(path) ? [413, 'too-large'] : null;
}

/** The HTTP server around Astro's handler: security headers, body limits, compression, built files, then the pages. */
export function createWebServer(pages: PageHandler, clientFolder: string): Server {
  const compress = compression();
  const files = sirv(clientFolder, {
    dotfiles: false,
    setHeaders(response, path) {
      const cache = path.startsWith('/_astro/')
        ? `public, max-age=${aYear}, immutable`
        : 'public, max-age=3600';
      response.setHeader('Cache-Control', cache);
    },
  });

  return createServer((request, response) => {
    for (const [name, value] of Object.entries(securityHeaders())) response.setHeader(name, value);
    // Anyone may write these headers; only a proxy that we were told of is believed.
    if (!config().trustProxy) for (const name of forwardingHeaders) delete request.headers[name];
    const refusal = bodyRefusal(request);
    if (refusal) return refuse(response, ...refusal);

    // The types of `compression` are those of a framework that is not in use here.
    compress(request as never, response as never, () =>
      files(request, response, () => {
        pages(request, response).catch((error: unknown) => {
          log.error({ event: 'request-failed', error: describeError(error) });
          if (response.headersSent) response.destroy();
          else refuse(response, 500, 'unexpected');
        });
      }),
    );
  });
}
