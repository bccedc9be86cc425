import twilio from 'twilio';
import { z } from 'zod';
import { isNeverReached, type SendOutcome } from './send-outcome.ts';

type Failure = Exclude<SendOutcome, { outcome: 'accepted' }>;

/** An answer that says "not now". Raised instead of the SDK's own error, which forgets the headers. */
export class TextServiceBusy extends Error {
  readonly status: number;
  readonly retryAfterSeconds: number | undefined;
  constructor(status: number, retryAfterSeconds: number | undefined) {
    super(`The text service answered ${status}.`);
    this.name = 'TextServiceBusy';
    this.status = status;
    this.retryAfterSeconds = retryAfterSeconds;
  }
}

/** A gateway between us and the service gave up: the service itself may have taken the text. */
const unclearStatuses = new Set([502, 504]);
/** Faults of our own set-up. They are mended by the shop's admin, and the text is as good afterwards. */
const setUpStatuses = new Set([401, 403, 404]);

const networkErrorSchema = z.object({ code: z.string() });

/**
 * Reads a failed call of the text service.
 * @param error what the SDK threw
 * @returns refused for what the service will never take, retryLater for what it certainly does not have, else unsure
 */
export function readTextServiceError(error: unknown): Failure {
  if (error instanceof TextServiceBusy) return readBusy(error);
  if (error instanceof twilio.RestException) {
    const code = String(error.code ?? error.status);
    return { outcome: setUpStatuses.has(error.status) ? 'retryLater' : 'refused', code };
  }
  const network = networkErrorSchema.safeParse(error);
  const code = network.success ? network.data.code : 'unknown';
  return { outcome: isNeverReached(code) ? 'retryLater' : 'unsure', code };
}

function readBusy({ status, retryAfterSeconds }: TextServiceBusy): Failure {
  const code = String(status);
  if (unclearStatuses.has(status)) return { outcome: 'unsure', code };
  return { outcome: 'retryLater', code, ...(retryAfterSeconds === undefined ? {} : { retryAfterSeconds }) };
}

/**
 * Reads a Retry-After header (RFC 9110, 10.2.3): seconds or an HTTP date.
 * @param now milliseconds UTC
 */
export function readRetryAfter(header: unknown, now: number): number | undefined {
  if (typeof header !== 'string') return undefined;
  if (/^\d{1,6}$/.test(header)) return Number(header);
  const at = Date.parse(header);
  return Number.isNaN(at) ? undefined : Math.max(0, Math.ceil((at - now) / 1000));
}
