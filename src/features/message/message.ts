export type Channel = 'text' | 'mail';

/** How far a message got. A text whose fate is unknown is `unsure` until the service's own list settles it. */
export const messageStates = [
  'waiting',
  'sending',
  'unsure',
  'sent',
  'delivered',
  'failed',
  'cancelled',
] as const;
export type MessageState = (typeof messageStates)[number];

/**
 * What may follow what. A status webhook may overtake everything we know ourselves, so a message that the service
 * reports on moves to `sent` or beyond even from `waiting` (given up as not sent, and sent after all).
 */
export const messageMoves: Readonly<Record<MessageState, readonly MessageState[]>> = {
  waiting: ['sending', 'cancelled', 'failed', 'sent', 'delivered'],
  sending: ['sent', 'waiting', 'unsure', 'failed', 'delivered'],
  unsure: ['sent', 'waiting', 'failed', 'delivered'],
  sent: ['delivered', 'failed'],
  delivered: [],
  failed: [],
  cancelled: [],
};

export function mayMove(from: MessageState, to: MessageState): boolean {
  return messageMoves[from].includes(to);
}

/** What the service says about a message, in our four steps. */
export type ProviderStatus = 'accepted' | 'sent' | 'delivered' | 'undelivered';

const ourWord: ReadonlyMap<string, ProviderStatus> = new Map([
  ['accepted', 'accepted'],
  ['scheduled', 'accepted'],
  ['queued', 'accepted'],
  ['sending', 'accepted'],
  ['sent', 'sent'],
  ['delivered', 'delivered'],
  ['read', 'delivered'],
  ['undelivered', 'undelivered'],
  ['failed', 'undelivered'],
  ['canceled', 'undelivered'],
]);

/** The service's word for a status as ours; undefined for one that says nothing about a text on its way out. */
export function readProviderStatus(word: string): ProviderStatus | undefined {
  return ourWord.get(word);
}

const rankOf: Readonly<Record<ProviderStatus, number>> = {
  accepted: 0,
  sent: 1,
  delivered: 2,
  undelivered: 2,
};

/** Whether news of the service goes beyond what it said before. Reports arrive in any order; the first final one holds. */
export function isNews(before: ProviderStatus | null, now: ProviderStatus): boolean {
  return before === null || rankOf[now] > rankOf[before];
}

/** The state a message has once the service said so. */
export function stateOfStatus(status: ProviderStatus): MessageState {
  if (status === 'delivered') return 'delivered';
  return status === 'undelivered' ? 'failed' : 'sent';
}

/** Why we gave a message up ourselves; everything else in `error_code` is the service's own code. */
export type FailureCode =
  | 'no-consent'
  | 'opted-out'
  | 'address-changed'
  | 'not-active'
  | 'no-hours'
  | 'attempts';

/** The service's code for a number that has opted out. */
export const optedOutCode = '21610';
