import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import { type Answer, type Ask, jsonAnswer, noAnswer, type Route } from './answer.ts';

const loopback = '127.0.0.1';
/** Pictures come along with a text. */
const bodyLimit = 16 * 1024 * 1024;
const contentPolicy =
  "default-src 'none'; style-src 'self'; script-src 'self'; connect-src 'self'; form-action 'self'; base-uri 'none'; frame-ancestors 'none'";

/** A small HTTP server on loopback only. */
export interface LoopbackServer {
  url: string;
  stop(): Promise<void>;
}

/**
 * @param routes tried in order, first match answers
 * @param port 0 takes any free one
 * @throws when the port is taken
 */
export async function startLoopbackServer(routes: readonly Route[], port: number): Promise<LoopbackServer> {
  const server = createServer((request, response) => {
    answerRequest(routes, request, response).catch(() => response.destroy());
  });
  // Longer than any caller keeps a line open: one that is closed at that very moment would lose a request.
  server.keepAliveTimeout = 120_000;
  await listen(server, port);
  const address = server.address() as AddressInfo;
  return {
    url: `http://${loopback}:${address.port}`,
    stop: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}

function listen(server: Server, port: number): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, loopback, () => resolve());
  });
}

async function answerRequest(
  routes: readonly Route[],
  request: IncomingMessage,
  response: ServerResponse,
): Promise<void> {
  const answer = await findAnswer(routes, request);
  if (answer === noAnswer) return;
  response.writeHead(answer.status, {
    'content-type': answer.type,
    'cache-control': 'no-store',
    'content-security-policy': contentPolicy,
    'x-content-type-options': 'nosniff',
    'referrer-policy': 'same-origin',
    ...answer.headers,
  });
  response.end(answer.body);
}

async function findAnswer(
  routes: readonly Route[],
  request: IncomingMessage,
): Promise<Answer | typeof noAnswer> {
  const url = new URL(request.url ?? '/', `http://${loopback}`);
  const found = routes
    .filter((route) => route.method === request.method)
    .map((route) => ({ route, match: route.path.exec(url.pathname) }))
    .find(({ match }) => match !== null);
  if (found === undefined) return jsonAnswer({ message: 'There is nothing at this address.' }, 404);
  if (found.route.caller === 'page' && isForeign(request)) {
    return jsonAnswer({ message: 'Only pages of this server may ask for this.' }, 403);
  }
  const body = await readBody(request);
  if (body === undefined) return jsonAnswer({ message: 'The body is too long.' }, 413);
  const ask: Ask = {
    method: found.route.method,
    url,
    parts: (found.match ?? []).slice(1).map((part) => decodeURIComponent(part)),
    headers: request.headers,
    body,
  };
  return found.route.handle(ask);
}

/** A page of somewhere else in the same browser must not answer texts: neither by its origin nor by a name of its own. */
function isForeign(request: IncomingMessage): boolean {
  const host = request.headers.host ?? '';
  const isOwnHost = /^(127\.0\.0\.1|localhost|\[::1\]):\d+$/.test(host);
  const origin = request.headers.origin;
  return !isOwnHost || (origin !== undefined && origin !== `http://${host}`);
}

async function readBody(request: IncomingMessage): Promise<string | undefined> {
  const chunks: Buffer[] = [];
  let length = 0;
  for await (const chunk of request) {
    const bytes = Buffer.from(chunk);
    length += bytes.length;
    if (length > bodyLimit) return undefined;
    chunks.push(bytes);
  }
  return Buffer.concat(chunks).toString('utf8');
}
