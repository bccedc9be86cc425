import twilio from 'twilio';
import {
  type ListedText,
  statusWebhookUrl,
  type TextGateway,
  type TextGatewaySettings,
  type TextListing,
} from './text-gateway.ts';
import { readRetryAfter, readTextServiceError, TextServiceBusy } from './text-service-error.ts';

type HttpClient = NonNullable<NonNullable<Parameters<typeof twilio>[2]>['httpClient']>;
type TwilioText = Awaited<ReturnType<ReturnType<typeof twilio>['messages']['list']>>[number];

const defaultTimeoutMilliseconds = 10_000;
const pageSize = 200;
/** Where the hosted service answers. */
export const hostedUrl = 'https://api.twilio.com';
/** More than a shop receives in any gap worth speaking of; keeps a runaway list from filling the memory. */
const longestListing = 5000;

/**
 * The text service through its SDK. The SDK's own retries are off: the outbox alone decides about a second attempt.
 * @param clock gives milliseconds UTC; only a Retry-After date needs it
 */
export function createTwilioGateway(settings: TextGatewaySettings, clock: () => number): TextGateway {
  const { accountSid, authToken, publicUrl } = settings;
  const client = twilio(accountSid, authToken, { httpClient: createHttpClient(settings, clock) });

  const list = async (
    question: { to: string; from?: string; since: number },
    directions: readonly string[],
  ): Promise<TextListing> => {
    const { since, ...filter } = question;
    try {
      // The service's dates are whole seconds.
      const dateSentAfter = new Date(Math.floor(since / 1000) * 1000);
      const texts = await client.messages.list({ ...filter, dateSentAfter, pageSize, limit: longestListing });
      return {
        outcome: 'listed',
        texts: texts.filter(({ direction }) => directions.includes(direction)).map(describeText),
      };
    } catch (error) {
      return { outcome: 'retryLater', code: readTextServiceError(error).code };
    }
  };

  return {
    send: async ({ messageId, from, to, body }) => {
      try {
        const statusCallback = statusWebhookUrl(publicUrl, messageId);
        const text = await client.messages.create({ from, to, body, statusCallback });
        const segments = Number(text.numSegments);
        return {
          outcome: 'accepted',
          providerId: text.sid,
          status: text.status,
          ...(segments > 0 ? { segments } : {}),
        };
      } catch (error) {
        return readTextServiceError(error);
      }
    },
    listSent: (question) => list(question, ['outbound-api']),
    listReceived: (question) => list(question, ['inbound']),
    listMedia: async (providerId) => {
      try {
        const media = await client.messages(providerId).media.list({ limit: 10 });
        const base = settings.apiUrl ?? hostedUrl;
        const addresses = media.map(({ uri }) => new URL(uri.replace(/\.json$/, ''), base).href);
        return { outcome: 'listed', addresses };
      } catch (error) {
        return { outcome: 'retryLater', code: readTextServiceError(error).code };
      }
    },
  };
}

function describeText(text: TwilioText): ListedText {
  return {
    providerId: text.sid,
    from: text.from,
    to: text.to,
    body: text.body,
    status: text.status,
    sentAt: (text.dateSent ?? text.dateCreated).getTime(),
    mediaCount: Number(text.numMedia),
  };
}

/** The SDK's client, turned to another address where one is configured, and telling when to come back. */
function createHttpClient(settings: TextGatewaySettings, clock: () => number): HttpClient {
  const { apiUrl, timeoutMilliseconds = defaultTimeoutMilliseconds } = settings;
  const client = new twilio.RequestClient({ timeout: timeoutMilliseconds, autoRetry: false });
  const request = client.request.bind(client);
  client.request = async (options) => {
    const { pathname, search } = new URL(options.uri);
    const uri = apiUrl === undefined ? options.uri : new URL(pathname + search, apiUrl).href;
    const response = await request({ ...options, uri, timeout: timeoutMilliseconds });
    const { statusCode, headers } = response;
    if (statusCode === 429 || statusCode >= 500) {
      throw new TextServiceBusy(statusCode, readRetryAfter(headers?.['retry-after'], clock()));
    }
    return response;
  };
  return client;
}
