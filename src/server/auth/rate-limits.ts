import { RateLimiterRes } from 'rate-limiter-flexible';
import { AppError } from '../errors.ts';
import { RateLimiter } from './rate-limiter.ts';
import { keyedHash } from './token.ts';

const minute = 60;
const hour = 60 * minute;
const day = 24 * hour;

const limiters = {
  /** Tries to sign in, by address and network. */
  'sign-in': new RateLimiter({ name: 'sign-in', tries: 5, seconds: minute }),
  /** Tries to sign in from one network, under whatever address: checking a password is costly. */
  'sign-in-network': new RateLimiter({ name: 'sign-in-network', tries: 60, seconds: minute }),
  reset: new RateLimiter({ name: 'reset', tries: 5, seconds: hour }),
  invite: new RateLimiter({ name: 'invite', tries: 5, seconds: hour }),
  link: new RateLimiter({ name: 'link', tries: 30, seconds: minute }),
  token: new RateLimiter({ name: 'token', tries: 120, seconds: minute }),
};
export type RateLimit = keyof typeof limiters;

/** How long sign-in rests after the first, second, … time that the tries of a minute were used up, in seconds. */
const pauses = [1, 2, 4, 8, 15].map((minutes) => minutes * minute);
const pauseCount = new RateLimiter({ name: 'sign-in-pauses', tries: pauses.length, seconds: day });

/** Addresses and networks are kept as keyed hashes only. */
function keyOf(parts: string[]): string {
  return keyedHash('rate limit', parts.join('\n'));
}

function tooMany(milliseconds: number): AppError {
  return new AppError('too-many', { retryAfterSeconds: Math.max(1, Math.ceil(milliseconds / 1000)) });
}

/** What the package rejects with when the tries are used up; anything else is a fault and is thrown on. */
function asRefusal(thrown: unknown): RateLimiterRes {
  if (thrown instanceof RateLimiterRes) return thrown;
  throw thrown;
}

/**
 * Counts one try.
 * @throws AppError `too-many` with the seconds to wait
 */
export async function countTry(limit: RateLimit, ...key: string[]): Promise<void> {
  try {
    await limiters[limit].consume(keyOf(key));
  } catch (thrown) {
    throw tooMany(asRefusal(thrown).msBeforeNext);
  }
}

/**
 * Counts one try to sign in. When the tries of a minute are used up, sign-in under this address from this network rests:
 * 1, 2, 4, 8, then 15 minutes each time. Tries during a rest do not make it longer, so nobody is locked out for good.
 * @throws AppError `too-many` with the seconds to wait
 */
export async function countSignInTry(who: { address: string; network: string }): Promise<void> {
  await countTry('sign-in-network', who.network);
  const key = keyOf([who.address, who.network]);
  const limiter = limiters['sign-in'];
  try {
    await limiter.consume(key);
  } catch (thrown) {
    const refusal = asRefusal(thrown);
    // Only the try that crosses the limit begins a rest; the ones after it find it begun.
    if (refusal.consumedPoints !== limiter.points + 1) throw tooMany(refusal.msBeforeNext);
    const { consumedPoints } = await pauseCount.penalty(key);
    const seconds = pauses[Math.min(consumedPoints, pauses.length) - 1] ?? minute;
    await limiter.block(key, seconds);
    throw tooMany(seconds * 1000);
  }
}

/** Forgets the tries under an address from a network: whoever knows the password starts afresh. */
export async function forgetSignInTries(who: { address: string; network: string }): Promise<void> {
  const key = keyOf([who.address, who.network]);
  await limiters['sign-in'].delete(key);
  await pauseCount.delete(key);
}
