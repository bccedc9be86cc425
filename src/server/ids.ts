import { randomInt } from 'node:crypto';
import { v7, validate, version } from 'uuid';
import { z } from 'zod';
import { now } from './clock.ts';

let lastMoment = 0;
let sequence = 0;

/**
 * A new UUIDv7: ids that a process makes later sort later, so lists by id are lists by time. Within one millisecond, and
 * while the clock stands behind, a counter keeps the order (RFC 9562, 6.2).
 */
export function newId(): string {
  const moment = Math.floor(now());
  if (moment > lastMoment) {
    lastMoment = moment;
    sequence = randomInt(2 ** 31);
  } else {
    sequence += 1;
  }
  return v7({ msecs: lastMoment, seq: sequence });
}

/** An id as a client may send it. */
export const idSchema = z.string().refine((text) => validate(text) && version(text) === 7);
