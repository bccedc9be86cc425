import { z } from 'zod';
import type { SharedClock } from './clock.ts';
import { type Answer, type Ask, jsonAnswer, type Route, seeOther } from './http/answer.ts';
import type { Mailbox } from './mail/mailbox.ts';
import { refreshScript, styleSheet } from './page/style.ts';
import { type Faults, faultsChangeSchema, noFaults } from './text-service/faults.ts';
import type { TextService } from './text-service/text-service.ts';

const hourMilliseconds = 3_600_000;
const pictureSchema = z
  .strictObject({ type: z.string(), base64: z.base64() })
  .transform(({ type, base64 }) => ({ type, bytes: Buffer.from(base64, 'base64') }));
const textSchema = z.strictObject({
  from: z.string(),
  to: z.string(),
  body: z.string(),
  pictures: z.array(pictureSchema).max(10).default([]),
});
const clockSchema = z.strictObject({ moveMilliseconds: z.number().int() });

/** What tests and demos steer the stand-ins by: faults, texts from a phone, the clock, and what was kept. */
export function controlRoutes(options: {
  service: TextService;
  mailbox: Mailbox;
  clock: SharedClock;
  faults: Faults;
}): Route[] {
  const { service, mailbox, clock, faults } = options;

  const route = (method: Route['method'], path: RegExp, handle: (ask: Ask) => Answer): Route => ({
    method,
    path,
    handle,
    caller: 'page',
  });

  return [
    route('GET', /^\/fake\/faults$/, () => jsonAnswer(faults)),
    route('POST', /^\/fake\/faults$/, ({ body }) =>
      withBody(body, faultsChangeSchema, (change) => {
        for (const [name, value] of Object.entries(change)) {
          if (value !== undefined) Object.assign(faults, { [name]: value });
        }
        return jsonAnswer(faults);
      }),
    ),
    route('DELETE', /^\/fake\/faults$/, () => jsonAnswer(Object.assign(faults, noFaults()))),
    // `?from=100` leaves out the first hundred, for whoever has them.
    route('GET', /^\/fake\/texts$/, ({ url }) =>
      jsonAnswer(service.state.texts.slice(Number(url.searchParams.get('from') ?? 0))),
    ),
    route('POST', /^\/fake\/texts$/, ({ body }) =>
      withBody(body, textSchema, (text) => jsonAnswer(service.receive(text), 201)),
    ),
    route('GET', /^\/fake\/deliveries$/, () => jsonAnswer(service.state.deliveries)),
    route('POST', /^\/fake\/deliveries\/(\d+)\/again$/, ({ parts }) =>
      jsonAnswer({}, service.repeatDelivery(Number(parts[0])) ? 202 : 404),
    ),
    route('GET', /^\/fake\/mails$/, () => jsonAnswer(mailbox.mails)),
    route('POST', /^\/fake\/clock$/, ({ body }) =>
      withBody(body, clockSchema, ({ moveMilliseconds }) => {
        clock.move(moveMilliseconds);
        return jsonAnswer({ now: clock.now(), offset: clock.offset() });
      }),
    ),
    route('POST', /^\/clock\/hour$/, ({ body }) => {
      clock.move(hourMilliseconds);
      const back = new URLSearchParams(body).get('back') ?? '/phones';
      return seeOther(/^\/(phones|mail|webhooks)(\/|$)/.test(back) ? back : '/phones');
    }),
    route('GET', /^\/fakes\.css$/, () => ({
      status: 200,
      type: 'text/css; charset=utf-8',
      body: styleSheet,
    })),
    route('GET', /^\/refresh\.js$/, () => ({
      status: 200,
      type: 'text/javascript; charset=utf-8',
      body: refreshScript,
    })),
  ];
}

function withBody<T>(body: string, schema: z.ZodType<T>, handle: (value: T) => Answer): Answer {
  let value: unknown;
  try {
    value = JSON.parse(body);
  } catch {
    return jsonAnswer({ message: 'The body must be JSON.' }, 400);
  }
  const parsed = schema.safeParse(value);
  if (!parsed.success) return jsonAnswer({ message: z.prettifyError(parsed.error) }, 422);
  return handle(parsed.data);
}
