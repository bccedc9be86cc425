import { createHmac } from 'node:crypto';
import type { SharedClock } from '../clock.ts';
import type { Faults } from './faults.ts';
import type { Delivery } from './kept-texts.ts';

const keptDeliveries = 1000;
const answerMilliseconds = 15_000;

export interface WebhookCall {
  kind: Delivery['kind'];
  /** The configured public address, query included: this is what is signed. */
  url: string;
  parameters: Record<string, string>;
}

export interface WebhookCaller {
  call(call: WebhookCall): void;
  /** Delivers a listed call once more. */
  repeat(number: number): boolean;
  stop(): void;
}

/**
 * The signature the service puts on a webhook: base64 of HMAC-SHA1, keyed with the account's token, over the full
 * address followed by every parameter's name and value, sorted by name. Source: the text service's published rules
 * for X-Twilio-Signature; the tests check it with the SDK's own validateRequest.
 */
export function signWebhook(token: string, url: string, parameters: Record<string, string>): string {
  const sorted = Object.entries(parameters).sort(([one], [other]) => (one < other ? -1 : 1));
  return createHmac('sha1', token)
    .update(url + sorted.map(([name, value]) => name + value).join(''))
    .digest('base64');
}

/** Calls the product's webhooks: once each, whatever comes back, as the real service does for texts. */
export function openWebhookCaller(options: {
  deliveries: Delivery[];
  faults: () => Faults;
  clock: SharedClock;
  authToken: string;
  /** Scheme, host and port that really answer for the public address. */
  target: string;
  changed: () => void;
}): WebhookCaller {
  const { deliveries, faults, clock, authToken, target, changed } = options;
  const stopping = new AbortController();
  for (const delivery of deliveries) {
    // The process ended in the middle of the call: nobody knows whether it was heard.
    if (delivery.outcome === 'under way') delivery.outcome = 'missed';
  }

  const deliver = async (delivery: Delivery): Promise<void> => {
    delivery.outcome = 'under way';
    const { pathname, search } = new URL(delivery.url);
    try {
      const response = await fetch(new URL(pathname + search, target), {
        method: 'POST',
        headers: {
          'content-type': 'application/x-www-form-urlencoded; charset=UTF-8',
          'x-twilio-signature': signWebhook(authToken, delivery.url, delivery.parameters),
        },
        body: new URLSearchParams(delivery.parameters).toString(),
        redirect: 'manual',
        signal: AbortSignal.any([stopping.signal, AbortSignal.timeout(answerMilliseconds)]),
      });
      await response.arrayBuffer();
      delivery.httpStatus = response.status;
      delivery.outcome = response.ok ? 'taken' : 'refused';
    } catch {
      delivery.outcome = 'missed';
    }
    changed();
  };

  const list = (call: WebhookCall): Delivery => {
    const number = (deliveries.at(-1)?.number ?? 0) + 1;
    const delivery: Delivery = { ...call, number, at: clock.now(), outcome: 'missed', httpStatus: null };
    deliveries.push(delivery);
    if (deliveries.length > keptDeliveries) deliveries.shift();
    changed();
    return delivery;
  };

  const timers = new Set<NodeJS.Timeout>();
  const after = (milliseconds: number, step: () => void): void => {
    const timer = setTimeout(() => {
      timers.delete(timer);
      step();
    }, milliseconds);
    timers.add(timer);
  };

  let gathered: Delivery[] = [];
  /** Sends a call on its way: at once, late, or with others in the wrong order, as the faults have it. */
  const dispatch = (delivery: Delivery): void => {
    const { delayWebhooks, reverseWebhooks } = faults();
    if (reverseWebhooks.gatherMilliseconds > 0) {
      if (gathered.length === 0) {
        after(reverseWebhooks.gatherMilliseconds, () => {
          const inReverse = gathered.reverse();
          gathered = [];
          void deliverInTurn(inReverse);
        });
      }
      gathered.push(delivery);
    } else if (delayWebhooks.upToMilliseconds > 0) {
      after(Math.random() * delayWebhooks.upToMilliseconds, () => void deliver(delivery));
    } else {
      void deliver(delivery);
    }
  };

  /** One after the other, so that the order is the one that was meant. */
  const deliverInTurn = async (waiting: readonly Delivery[]): Promise<void> => {
    for (const delivery of waiting) await deliver(delivery);
  };

  return {
    call: (call) => {
      const times = faults().duplicateWebhooks ? 2 : 1;
      const isUp = faults().webhooks === 'on' && clock.now() >= faults().downUntil;
      for (let time = 0; time < times; time += 1) {
        const delivery = list(call);
        if (isUp) dispatch(delivery);
      }
    },
    repeat: (number) => {
      const delivery = deliveries.find((one) => one.number === number);
      if (delivery === undefined) return false;
      void deliver(delivery);
      return true;
    },
    stop: () => {
      timers.forEach(clearTimeout);
      stopping.abort();
    },
  };
}
