import type { SharedClock } from '../clock.ts';
import { pageAnswer, type Route, seeOther } from '../http/answer.ts';
import { pageFrame, writeTime } from '../page/frame.ts';
import { type Html, html, linkAddresses } from '../page/html.ts';
import type { KeptMail, Mailbox } from './mailbox.ts';

/** The pages of the mailbox: all mails, and one of them with its links to follow. */
export function mailRoutes(mailbox: Mailbox, clock: SharedClock): Route[] {
  return [
    {
      method: 'GET',
      path: /^\/mail$/,
      caller: 'page',
      handle: () =>
        pageAnswer(pageFrame({ title: 'Mail', path: '/mail', clock, content: mailList(mailbox.mails) })),
    },
    {
      method: 'GET',
      path: /^\/mail\/([^/]+)$/,
      caller: 'page',
      handle: ({ parts }) => {
        const mail = mailbox.mails.find(({ id }) => id === parts[0]);
        if (mail === undefined) return seeOther('/mail');
        const path = `/mail/${mail.id}`;
        return pageAnswer(pageFrame({ title: mail.subject, path, clock, content: openMail(mail) }));
      },
    },
  ];
}

function mailList(mails: readonly KeptMail[]): Html {
  const rows = [...mails].reverse().map(
    (mail) => html`<li><a class="row" href="/mail/${mail.id}">
  <span class="top"><strong>${mail.subject}</strong><span class="quiet">${writeTime(mail.receivedAt)}</span></span>
  <span class="quiet">to ${mail.recipients.join(', ')}</span>
  <span class="cut">${mail.text}</span>
</a></li>`,
  );
  return html`<h1>Mail</h1>
<div id="mails" data-live>${rows.length === 0 ? html`<p class="quiet">No mail yet. Invite someone in the app, and the mail shows up here.</p>` : html`<ul class="rows">${rows}</ul>`}</div>`;
}

function openMail(mail: KeptMail): Html {
  return html`<p><a href="/mail">All mail</a></p>
<article class="mail">
  <h1>${mail.subject}</h1>
  <dl>
    <dt>From</dt><dd>${mail.from}</dd>
    <dt>To</dt><dd>${mail.to}</dd>
    <dt>Came</dt><dd>${writeTime(mail.receivedAt)}</dd>
  </dl>
  <div class="words">${linkAddresses(mail.text)}</div>
</article>`;
}
