import type { SendOutcome } from './send-outcome.ts';

export interface OutgoingText {
  /** Our own id: it travels with the status webhook, which may arrive before the answer to this call. */
  messageId: string;
  /** The shop's number and the person's, in E.164 form. */
  from: string;
  to: string;
  body: string;
}

/** A text as the service lists it. `sentAt` is in milliseconds UTC, exact to the second. */
export interface ListedText {
  providerId: string;
  from: string;
  to: string;
  body: string;
  status: string;
  sentAt: number;
  mediaCount: number;
}

/** Half-open on neither side: the service's dates are whole seconds, both ends belong to it. */
export interface SentQuestion {
  from: string;
  to: string;
  since: number;
}

export type MediaListing =
  | { outcome: 'listed'; addresses: string[] }
  | { outcome: 'retryLater'; code: string };

export type TextListing =
  | { outcome: 'listed'; texts: ListedText[] }
  | { outcome: 'retryLater'; code: string };

/** The service that carries texts, as the product sees it. */
export interface TextGateway {
  /** Hands one text over, once: whoever calls decides about trying again. Never throws for the service's failures. */
  send(text: OutgoingText): Promise<SendOutcome>;
  /** Texts that the service sent from one number to one person since a time: settles what stayed unsure. */
  listSent(question: SentQuestion): Promise<TextListing>;
  /** Texts that the service received for a number since a time: finds what the webhook missed. */
  listReceived(question: { to: string; since: number }): Promise<TextListing>;
  /** The addresses of the pictures of a text, where the webhook that tells them was missed. */
  listMedia(providerId: string): Promise<MediaListing>;
}

export interface TextGatewaySettings {
  accountSid: string;
  authToken: string;
  /** The service's address when it is not the hosted one. */
  apiUrl?: string | undefined;
  /** The product's configured public address: status webhooks go there. */
  publicUrl: string;
  timeoutMilliseconds?: number;
}

export const statusWebhookPath = '/api/texts/status';
export const inboundWebhookPath = '/api/texts/inbound';

/** Where the service reports what became of a message. */
export function statusWebhookUrl(publicUrl: string, messageId: string): string {
  const url = new URL(statusWebhookPath, publicUrl);
  url.searchParams.set('m', messageId);
  return url.href;
}
