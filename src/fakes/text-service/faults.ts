import { z } from 'zod';

const count = z.number().int().min(0).max(100_000);

/**
 * What is to go wrong, as the test or a demo wants it. Counts run down as the faults happen; switches stay on.
 * New kinds of trouble get a field here, a place that acts on it, and thereby a way in through POST /fake/faults.
 */
const fields = {
  /** The next sends are refused with this HTTP status and nothing is kept. */
  failNextSends: z.strictObject({
    count,
    status: z.number().int().min(400).max(599),
    code: z.number().int().optional(),
    retryAfterSeconds: z.number().int().min(0).optional(),
  }),
  /** Every answer of the API waits this long. */
  delayMilliseconds: z.number().int().min(0).max(120_000),
  /** The next sends are kept and go out, but their answer never comes. */
  swallowNextAnswers: count,
  /** The next texts end undelivered, with this error code. */
  undeliverNext: z.strictObject({ count, errorCode: z.number().int() }),
  /** Each webhook is delivered twice. */
  duplicateWebhooks: z.boolean(),
  /** Each webhook is delivered only after a wait of up to so long, each its own: they arrive late and mixed up. */
  delayWebhooks: z.strictObject({ upToMilliseconds: z.number().int().min(0).max(120_000) }),
  /** Webhooks are gathered for so long and then delivered newest first; 0: as they come. */
  reverseWebhooks: z.strictObject({ gatherMilliseconds: z.number().int().min(0).max(120_000) }),
  /** The next sends are refused as to a phone that has opted out, whatever the phone thinks. */
  optOutNext: z.strictObject({ count }),
  /** Until this moment of the clock (milliseconds UTC) every call answers 503 and no webhook is called; 0: it is up. */
  downUntil: z.number().int().min(0),
  /** Off: webhooks are not called; what they would have said stays listed as missed. */
  webhooks: z.enum(['on', 'off']),
  /** The next mails are refused with this SMTP code. */
  refuseNextMails: z.strictObject({ count, code: z.number().int().min(400).max(599) }),
} as const;

export const faultsSchema = z.strictObject(fields).required();
export type Faults = z.output<typeof faultsSchema>;

/** What POST /fake/faults takes: any part of it; the rest stays as it is. */
export const faultsChangeSchema = z.strictObject(fields).partial();

export function noFaults(): Faults {
  return {
    failNextSends: { count: 0, status: 500 },
    delayMilliseconds: 0,
    swallowNextAnswers: 0,
    undeliverNext: { count: 0, errorCode: 30_005 },
    duplicateWebhooks: false,
    delayWebhooks: { upToMilliseconds: 0 },
    reverseWebhooks: { gatherMilliseconds: 0 },
    optOutNext: { count: 0 },
    downUntil: 0,
    webhooks: 'on',
    refuseNextMails: { count: 0, code: 451 },
  };
}

/** Uses up one of a counted fault. */
export function takeOne(fault: { count: number }): boolean {
  if (fault.count === 0) return false;
  fault.count -= 1;
  return true;
}
