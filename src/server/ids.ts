import { v7, validate, version } from 'uuid';
import { z } from 'zod';
import { now } from './clock.ts';

/** A new UUIDv7: ids made later sort later, so lists by id are lists by time. */
export function newId(): string {
  return v7({ msecs: now() });
}

/** An id as a client may send it. */
export const idSchema = z.string().refine((text) => validate(text) && version(text) === 7);
