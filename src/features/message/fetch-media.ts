import { lookup as resolveName } from 'node:dns/promises';
import { type IncomingMessage, request as requestPlain } from 'node:http';
import { request as requestSecure } from 'node:https';
import { isPrivateAddress } from './private-address.ts';

export interface MediaSettings {
  /** The text service's own address, as configured. Only it may be asked first, and only it gets the key. */
  serviceUrl: string;
  accountSid: string;
  authToken: string;
  /** Hosts that the service hands pictures on to; a leading dot takes all hosts below. */
  allowedHosts: readonly string[];
  /** In earnest: https only, and never an address inside a house. A demo's service stands on this machine. */
  isLive: boolean;
  limitBytes: number;
  timeoutMilliseconds: number;
}

export type MediaAnswer =
  | { outcome: 'fetched'; bytes: Uint8Array }
  /** It will never be fetched: where it points, what it is or how large it is. */
  | { outcome: 'refused'; why: 'address' | 'host' | 'hops' | 'type' | 'size' | 'gone' }
  | { outcome: 'retryLater'; why: string };

const mostHops = 3;

/**
 * Fetches a picture that came with a text. The address came from outside, so it is trusted in nothing: the host must be
 * the configured service, each hop an allowed host, the address behind the name none inside a house (and that very
 * address is the one connected to), and what comes is counted while it is read.
 */
export async function fetchMedia(address: string, settings: MediaSettings): Promise<MediaAnswer> {
  let url = parseUrl(address);
  for (let hop = 0; hop <= mostHops; hop += 1) {
    if (url === null) return { outcome: 'refused', why: 'address' };
    const isService = url.host === new URL(settings.serviceUrl).host;
    if (hop === 0 ? !isService : !isService && !isAllowed(url.hostname, settings.allowedHosts)) {
      return { outcome: 'refused', why: 'host' };
    }
    const ip = await findAddress(url, isService, settings);
    if (typeof ip !== 'string') return ip;
    const answer = await ask(url, ip, hop === 0, settings);
    if (!('location' in answer)) return answer;
    url = parseUrl(answer.location, url);
  }
  return { outcome: 'refused', why: 'hops' };
}

function parseUrl(address: string, base?: URL): URL | null {
  if (!URL.canParse(address, base)) return null;
  const url = new URL(address, base);
  return url.username === '' && url.password === '' ? url : null;
}

function isAllowed(host: string, allowed: readonly string[]): boolean {
  return allowed.some((one) => (one.startsWith('.') ? host.endsWith(one) : host === one));
}

/** The one address that will be connected to, so that the name cannot mean another one a moment later. */
async function findAddress(
  url: URL,
  isService: boolean,
  { isLive }: MediaSettings,
): Promise<string | Exclude<MediaAnswer, { outcome: 'fetched' }>> {
  const mayBeInside = isService && !isLive;
  if (url.protocol !== 'https:' && !(mayBeInside && url.protocol === 'http:')) {
    return { outcome: 'refused', why: 'address' };
  }
  const name = url.hostname.replace(/^\[|\]$/g, '');
  const found = await resolveName(name, { all: true }).catch(() => []);
  const [first] = found;
  if (first === undefined) return { outcome: 'retryLater', why: 'no-such-host' };
  const isInside = found.some((one) => isPrivateAddress(one.address));
  return isInside && !mayBeInside ? { outcome: 'refused', why: 'address' } : first.address;
}

function ask(
  url: URL,
  ip: string,
  withKey: boolean,
  settings: MediaSettings,
): Promise<MediaAnswer | { location: string }> {
  const { accountSid, authToken, timeoutMilliseconds, limitBytes } = settings;
  const request = url.protocol === 'https:' ? requestSecure : requestPlain;
  const options = {
    signal: AbortSignal.timeout(timeoutMilliseconds),
    headers: { accept: 'image/*' },
    lookup: (_name: string, { all }: { all?: boolean }, done: (...found: unknown[]) => void) => {
      const family = ip.includes(':') ? 6 : 4;
      if (all) done(null, [{ address: ip, family }]);
      else done(null, ip, family);
    },
    ...(withKey ? { auth: `${accountSid}:${authToken}` } : {}),
  };
  return new Promise((resolve) => {
    const outgoing = request(url, options as never, (response: IncomingMessage) => {
      readAnswer(response, limitBytes).then(resolve, (error: NodeJS.ErrnoException) =>
        resolve({ outcome: 'retryLater', why: error.code ?? 'broken-off' }),
      );
    });
    outgoing.on('error', (error: NodeJS.ErrnoException) =>
      resolve({ outcome: 'retryLater', why: error.code ?? error.name }),
    );
    outgoing.end();
  });
}

async function readAnswer(
  response: IncomingMessage,
  limitBytes: number,
): Promise<MediaAnswer | { location: string }> {
  const { statusCode = 0, headers } = response;
  const leave = <T>(answer: T): T => {
    response.destroy();
    return answer;
  };
  if (statusCode >= 300 && statusCode < 400 && headers.location !== undefined) {
    return leave({ location: headers.location });
  }
  if (statusCode === 404 || statusCode === 410) return leave({ outcome: 'refused', why: 'gone' });
  if (statusCode !== 200) return leave({ outcome: 'retryLater', why: String(statusCode) });
  if (!/^image\//i.test(headers['content-type'] ?? '')) return leave({ outcome: 'refused', why: 'type' });
  const chunks: Buffer[] = [];
  let length = 0;
  for await (const chunk of response) {
    const bytes = Buffer.from(chunk);
    length += bytes.length;
    if (length > limitBytes) return leave({ outcome: 'refused', why: 'size' });
    chunks.push(bytes);
  }
  return { outcome: 'fetched', bytes: Buffer.concat(chunks) };
}
