import { isIPv6 } from 'node:net';
import type { APIContext } from 'astro';
import { config } from '../env.ts';

/** The first four of the eight groups of an IPv6 address: one household or firm has all that follow. */
function firstHalf(address: string): string {
  const [head = '', tail = ''] = address.split('::', 2);
  const left = head.split(':').filter(Boolean);
  const right = tail.split(':').filter(Boolean);
  const gap = address.includes('::') ? Math.max(0, 8 - left.length - right.length) : 0;
  return [...left, ...Array<string>(gap).fill('0'), ...right]
    .slice(0, 4)
    .map((group) => group.toLowerCase().replace(/^0+(?=.)/, ''))
    .join(':');
}

/**
 * The network that an address belongs to, as rate limits count it: an IPv4 address itself, of an IPv6 address its first
 * 64 bits.
 */
export function networkOf(address: string): string {
  const mapped = /^::ffff:(\d+\.\d+\.\d+\.\d+)$/i.exec(address);
  if (mapped?.[1]) return mapped[1];
  return isIPv6(address) ? `${firstHalf(address)}::` : address;
}

/**
 * The network that a request comes from. Behind the proxy we were told of, it is the last entry of `X-Forwarded-For`: the
 * one that this proxy wrote. The entries before it are what the sender claims.
 */
export function networkOfRequest(context: Pick<APIContext, 'request' | 'clientAddress'>): string {
  const forwarded = context.request.headers.get('x-forwarded-for')?.split(',').pop()?.trim();
  return networkOf(config().trustProxy && forwarded ? forwarded : context.clientAddress);
}
