import { randomBytes } from 'node:crypto';
import { countSegments } from '../../lib/messages/index.ts';
import type { SharedClock } from '../clock.ts';
import { openKeptDocument } from '../kept-document.ts';
import type { FakesSettings } from '../settings.ts';
import { carrierAnswers, decideCarrierAction } from './carrier-words.ts';
import { type Faults, takeOne } from './faults.ts';
import {
  emptyTextServiceState,
  type KeptText,
  type TextServiceState,
  textServiceStateSchema,
} from './kept-texts.ts';
import { openWebhookCaller } from './webhooks.ts';

/** A refusal with the text service's own error code. */
export interface SendRefusal {
  status: number;
  code: number;
  message: string;
}

export interface SendRequest {
  from: string;
  to: string;
  body: string;
  statusCallback: string | null;
}

/** A picture that goes with a text. */
export interface Picture {
  /** e.g. `image/jpeg`. */
  type: string;
  bytes: Uint8Array;
}

/** The text service without its HTTP: what it keeps and what it does by itself. */
export interface TextService {
  readonly state: TextServiceState;
  accept(request: SendRequest): KeptText | SendRefusal;
  /** A person at a phone sends a text to a shop's number. */
  receive(text: { from: string; to: string; body: string; pictures?: Picture[] }): KeptText;
  pictureOf(sid: string): Picture | undefined;
  repeatDelivery(number: number): boolean;
  isOptedOut(number: string, phone: string): boolean;
  stop(): void;
}

const phoneForm = /^\+[1-9]\d{6,14}$/;
const longestBody = 1600;

export function openTextService(options: {
  settings: FakesSettings;
  clock: SharedClock;
  faults: () => Faults;
  file: string | undefined;
  /** The address of the API, known once it listens. */
  apiUrl: () => string;
}): TextService {
  const { settings, clock, faults, apiUrl } = options;
  const pictures = new Map<string, Picture>();
  const kept = openKeptDocument({
    file: options.file,
    schema: textServiceStateSchema,
    empty: emptyTextServiceState(),
  });
  const state = kept.content;
  const timers = new Set<NodeJS.Timeout>();
  const webhooks = openWebhookCaller({
    deliveries: state.deliveries,
    faults,
    clock,
    authToken: settings.authToken,
    target: settings.webhookTarget,
    changed: kept.changed,
  });

  const keep = (text: Pick<KeptText, 'direction' | 'from' | 'to' | 'body' | 'status'>): KeptText => {
    const at = clock.now();
    const full: KeptText = {
      ...text,
      sid: `SM${randomBytes(16).toString('hex')}`,
      errorCode: null,
      segments: countSegments(text.body).segments,
      media: [],
      createdAt: at,
      updatedAt: at,
      statusCallback: null,
    };
    state.texts.push(full);
    kept.changed();
    return full;
  };

  const advance = (text: KeptText, status: KeptText['status'], errorCode: number | null = null): void => {
    Object.assign(text, { status, errorCode, updatedAt: clock.now() });
    kept.changed();
    if (text.statusCallback === null) return;
    webhooks.call({
      kind: 'status',
      url: text.statusCallback,
      parameters: describeStatus(text, settings.accountSid),
    });
  };

  const later = (step: () => void): void => {
    const timer = setTimeout(() => {
      timers.delete(timer);
      step();
    }, settings.stepMilliseconds);
    timers.add(timer);
  };

  /** What happens to an accepted text from here on; taken up again after a restart. */
  const carryOut = (text: KeptText): void => {
    if (text.status === 'queued') {
      later(() => {
        advance(text, 'sent');
        carryOut(text);
      });
    } else if (text.status === 'sent') {
      const { undeliverNext } = faults();
      const errorCode = takeOne(undeliverNext) ? undeliverNext.errorCode : null;
      later(() => advance(text, errorCode === null ? 'delivered' : 'undelivered', errorCode));
    }
  };
  state.texts.forEach(carryOut);

  const optOutKey = (number: string, phone: string): string => `${number} ${phone}`;
  const isOptedOut = (number: string, phone: string): boolean =>
    state.optedOut.includes(optOutKey(number, phone));

  return {
    state,
    isOptedOut,
    accept: (request) => {
      const refusal = findRefusal(request, isOptedOut(request.from, request.to));
      if (refusal !== undefined) return refusal;
      const { statusCallback, ...rest } = request;
      const text = keep({ direction: 'outbound-api', status: 'queued', ...rest });
      text.statusCallback = statusCallback;
      carryOut(text);
      return text;
    },
    pictureOf: (sid) => pictures.get(sid),
    receive: ({ from, to, body, pictures: sent = [] }) => {
      const text = keep({ direction: 'inbound', status: 'received', from, to, body });
      text.media = sent.map((picture) => {
        const sid = `ME${randomBytes(16).toString('hex')}`;
        pictures.set(sid, picture);
        return { sid, type: picture.type };
      });
      const action = decideCarrierAction(body, isOptedOut(to, from));
      if (action === 'opt out' && !isOptedOut(to, from)) state.optedOut.push(optOutKey(to, from));
      if (action === 'opt in') state.optedOut.splice(state.optedOut.indexOf(optOutKey(to, from)), 1);
      if (action !== 'none') {
        keep({
          direction: 'outbound-reply',
          status: 'delivered',
          from: to,
          to: from,
          body: carrierAnswers[action],
        });
      }
      const url = new URL('/api/texts/inbound', settings.publicUrl).href;
      const parameters = describeInbound(text, settings.accountSid, apiUrl());
      webhooks.call({ kind: 'inbound', url, parameters });
      return text;
    },
    repeatDelivery: webhooks.repeat,
    stop: () => {
      timers.forEach(clearTimeout);
      webhooks.stop();
      kept.close();
    },
  };
}

/** Error codes as the text service publishes them. */
function findRefusal(request: SendRequest, isOptedOut: boolean): SendRefusal | undefined {
  const refuse = (code: number, message: string): SendRefusal => ({ status: 400, code, message });
  if (!phoneForm.test(request.to)) return refuse(21_211, 'The number in To is not a phone number.');
  if (request.body === '') return refuse(21_602, 'A text needs a body.');
  if (request.body.length > longestBody) return refuse(21_617, 'The body is longer than 1600 characters.');
  if (!phoneForm.test(request.from)) return refuse(21_606, 'The number in From is not one of this account.');
  return isOptedOut ? refuse(21_610, 'The receiver has opted out of texts from this number.') : undefined;
}

/** Where a picture of a text is asked for. */
export function mediaPath(accountSid: string, textSid: string, mediaSid: string): string {
  return `/2010-04-01/Accounts/${accountSid}/Messages/${textSid}/Media/${mediaSid}`;
}

function describeText(text: KeptText, accountSid: string): Record<string, string> {
  return {
    AccountSid: accountSid,
    ApiVersion: '2010-04-01',
    From: text.from,
    MessageSid: text.sid,
    SmsSid: text.sid,
    To: text.to,
  };
}

function describeInbound(text: KeptText, accountSid: string, apiUrl: string): Record<string, string> {
  const media = text.media.flatMap(({ sid, type }, place) => [
    [`MediaUrl${place}`, apiUrl + mediaPath(accountSid, text.sid, sid)],
    [`MediaContentType${place}`, type],
  ]);
  return {
    ...describeText(text, accountSid),
    Body: text.body,
    NumMedia: String(text.media.length),
    ...Object.fromEntries(media),
    NumSegments: String(text.segments),
    SmsMessageSid: text.sid,
    SmsStatus: 'received',
  };
}

function describeStatus(text: KeptText, accountSid: string): Record<string, string> {
  return {
    ...describeText(text, accountSid),
    MessageStatus: text.status,
    SmsStatus: text.status,
    ...(text.errorCode === null ? {} : { ErrorCode: String(text.errorCode) }),
  };
}
