import type { SharedClock } from '../clock.ts';
import { type Answer, type Ask, pageAnswer, type Route, seeOther } from '../http/answer.ts';
import { pageFrame } from '../page/frame.ts';
import type { FakesSettings } from '../settings.ts';
import { listConversations, type PhoneConversation } from './conversations.ts';
import type { Faults } from './faults.ts';
import { conversationPath, phonesPage } from './phones-page.ts';
import type { TextService } from './text-service.ts';
import { webhooksPage } from './webhooks-page.ts';

/** The pages on which a person reads the phones and answers, and sees what the product was told. */
export function phoneRoutes(options: {
  settings: FakesSettings;
  service: TextService;
  clock: SharedClock;
  faults: () => Faults;
}): Route[] {
  const { settings, service, clock, faults } = options;

  const showPhones = (open?: Pick<PhoneConversation, 'phone' | 'number'>): Answer => {
    const all = listConversations(service.state.texts, settings.phones, settings.numbers);
    const found = all.find((one) => one.phone === open?.phone && one.number === open.number);
    if (open !== undefined && found === undefined) return seeOther('/phones');
    const isOptedOut = found !== undefined && service.isOptedOut(found.number, found.phone);
    return pageAnswer(
      pageFrame({
        title: found?.name ?? 'Phones',
        path: found === undefined ? '/phones' : conversationPath(found),
        clock,
        content: phonesPage(all, found, isOptedOut),
      }),
    );
  };

  const page = (method: Route['method'], path: RegExp, handle: (ask: Ask) => Answer): Route => ({
    method,
    path,
    handle,
    caller: 'page',
  });

  return [
    page('GET', /^\/$/, () => seeOther('/phones')),
    page('GET', /^\/phones$/, () => showPhones()),
    page('GET', /^\/phones\/([^/]+)\/([^/]+)$/, ({ parts }) => showPhones(conversationOf(parts))),
    page('POST', /^\/phones\/([^/]+)\/([^/]+)$/, ({ parts, body }) => {
      const open = conversationOf(parts);
      const words = new URLSearchParams(body).get('body')?.replaceAll('\r\n', '\n').trim() ?? '';
      if (words !== '') service.receive({ from: open.phone, to: open.number, body: words });
      return seeOther(conversationPath(open));
    }),
    page('GET', /^\/webhooks$/, () => {
      const content = webhooksPage(service.state.deliveries, faults());
      return pageAnswer(pageFrame({ title: 'Webhooks', path: '/webhooks', clock, content }));
    }),
    page('POST', /^\/webhooks\/(on|off)$/, ({ parts }) => {
      faults().webhooks = parts[0] === 'on' ? 'on' : 'off';
      return seeOther('/webhooks');
    }),
    page('POST', /^\/webhooks\/(\d+)\/again$/, ({ parts }) => {
      service.repeatDelivery(Number(parts[0]));
      return seeOther('/webhooks');
    }),
  ];
}

function conversationOf(parts: readonly string[]): Pick<PhoneConversation, 'phone' | 'number'> {
  const [phone = '', number = ''] = parts;
  return { phone, number };
}
