/** What became of one attempt to hand a text or a mail to the service that carries it. */
export type SendOutcome =
  /** The service has it. `status` is its own word for how far it got. */
  | { outcome: 'accepted'; providerId: string; status: string; segments?: number }
  /** It will never take this one. `code` is the service's own. */
  | { outcome: 'refused'; code: string }
  /** It certainly does not have it and may take it later; never before `retryAfterSeconds` where it said so. */
  | { outcome: 'retryLater'; code: string; retryAfterSeconds?: number }
  /** It may or may not have it: the line broke after we had begun to speak. */
  | { outcome: 'unsure'; code: string };

/** Errors of a connection that was never made, so that nothing can have arrived. */
const neverReached = new Set([
  'ECONNREFUSED',
  'ENOTFOUND',
  'EAI_AGAIN',
  'EHOSTUNREACH',
  'ENETUNREACH',
  'EHOSTDOWN',
  'ENETDOWN',
]);

/** True when an error code says that no connection was made. */
export function isNeverReached(code: string | undefined): boolean {
  return code !== undefined && neverReached.has(code);
}
