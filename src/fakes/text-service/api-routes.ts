import { setTimeout as wait } from 'node:timers/promises';
import type { SharedClock } from '../clock.ts';
import { type Answer, type Ask, jsonAnswer, noAnswer, type Route } from '../http/answer.ts';
import type { FakesSettings } from '../settings.ts';
import { describeForApi, listForApi } from './api-answers.ts';
import { type Faults, takeOne } from './faults.ts';
import type { TextService } from './text-service.ts';

const account = '/2010-04-01/Accounts/([^/]+)/Messages';

/** The calls of the text service's API that the product makes: send, list, look up one. */
export function textApiRoutes(options: {
  settings: FakesSettings;
  service: TextService;
  faults: () => Faults;
  clock: SharedClock;
}): Route[] {
  const { settings, service, faults, clock } = options;

  const behindTheDoor =
    (handle: (ask: Ask) => Answer | typeof noAnswer): Route['handle'] =>
    async (ask) => {
      if (!isSignedIn(ask, settings)) return errorAnswer(401, 20_003, 'Account and token do not match.');
      await wait(faults().delayMilliseconds);
      if (clock.now() < faults().downUntil) return errorAnswer(503, 20_503, 'The service is down.');
      return handle(ask);
    };

  return [
    {
      method: 'POST',
      path: new RegExp(`^${account}\\.json$`),
      caller: 'program',
      handle: behindTheDoor((ask) => send(ask, service, faults(), settings.accountSid)),
    },
    {
      method: 'GET',
      path: new RegExp(`^${account}\\.json$`),
      caller: 'program',
      handle: behindTheDoor((ask) =>
        jsonAnswer(listForApi(service.state.texts, ask.url, settings.accountSid)),
      ),
    },
    {
      method: 'GET',
      path: new RegExp(`^${account}/(SM[0-9a-f]{32})\\.json$`),
      caller: 'program',
      handle: behindTheDoor((ask) => {
        const text = service.state.texts.find(({ sid }) => sid === ask.parts[1]);
        if (text === undefined) return errorAnswer(404, 20_404, 'There is no such text.');
        return jsonAnswer(describeForApi(text, settings.accountSid));
      }),
    },
  ];
}

function send(ask: Ask, service: TextService, faults: Faults, accountSid: string): Answer | typeof noAnswer {
  const { failNextSends } = faults;
  if (takeOne(failNextSends)) {
    const { status, code, retryAfterSeconds } = failNextSends;
    const headers = retryAfterSeconds === undefined ? {} : { 'retry-after': String(retryAfterSeconds) };
    return errorAnswer(
      status,
      code ?? (status === 429 ? 20_429 : 20_500),
      'This fault was asked for.',
      headers,
    );
  }
  if (takeOne(faults.optOutNext)) {
    return errorAnswer(400, 21_610, 'The receiver has opted out of texts from this number.');
  }
  const form = new URLSearchParams(ask.body);
  const result = service.accept({
    from: form.get('From') ?? '',
    to: form.get('To') ?? '',
    body: form.get('Body') ?? '',
    statusCallback: form.get('StatusCallback'),
  });
  if ('code' in result) return errorAnswer(result.status, result.code, result.message);
  if (faults.swallowNextAnswers > 0) {
    faults.swallowNextAnswers -= 1;
    return noAnswer;
  }
  return jsonAnswer(describeForApi(result, accountSid), 201);
}

export function errorAnswer(
  status: number,
  code: number,
  message: string,
  headers: Record<string, string> = {},
): Answer {
  return jsonAnswer({ code, message, more_info: null, status }, status, headers);
}

export function isSignedIn(ask: Ask, settings: FakesSettings): boolean {
  const expected = Buffer.from(`${settings.accountSid}:${settings.authToken}`).toString('base64');
  return ask.headers.authorization === `Basic ${expected}` && ask.parts[0] === settings.accountSid;
}
