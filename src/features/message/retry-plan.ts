const second = 1000;
const minute = 60 * second;

/** Pauses after the first, second, … failed attempt, in milliseconds. The attempt after the last one is the last. */
export const retryPauses = [
  5 * second,
  15 * second,
  minute,
  5 * minute,
  15 * minute,
  30 * minute,
  60 * minute,
] as const;

export const mostAttempts = retryPauses.length + 1;

/** How much a pause may be longer or shorter, so that many messages do not come back in one crowd. */
const jitter = 0.2;

/**
 * When to try again.
 * @param attempts attempts made so far, 1 or more
 * @param retryAfterSeconds the least pause that the service asked for
 * @param random a number from 0 to below 1
 * @returns milliseconds from now, or null when that was the last attempt
 */
export function nextPause(plan: {
  attempts: number;
  retryAfterSeconds?: number | undefined;
  random: number;
}): number | null {
  const { attempts, retryAfterSeconds = 0, random } = plan;
  if (!Number.isInteger(attempts) || attempts < 1) {
    throw new RangeError('nextPause: plan.attempts must be a whole number from 1');
  }
  const pause = retryPauses[attempts - 1];
  if (pause === undefined) return null;
  const spread = pause * (1 + jitter * (2 * random - 1));
  return Math.round(Math.max(spread, retryAfterSeconds * second));
}
