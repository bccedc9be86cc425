import { countSegments } from '../../lib/messages/index.ts';
import { writeTime } from '../page/frame.ts';
import { type Html, html, linkAddresses, nothing } from '../page/html.ts';
import type { PhoneConversation } from './conversations.ts';
import type { KeptText } from './kept-texts.ts';

const statusWords: Readonly<Record<KeptText['status'], Html>> = {
  queued: html`on its way`,
  sent: html`sent`,
  delivered: html`<span class="fine">delivered</span>`,
  undelivered: html`<span class="bad">not delivered</span>`,
  received: html`sent`,
};

export function conversationPath({ phone, number }: Pick<PhoneConversation, 'phone' | 'number'>): string {
  return `/phones/${encodeURIComponent(phone)}/${encodeURIComponent(number)}`;
}

/** All phones, and beside them the open one: to be read and answered as the operator would. */
export function phonesPage(
  conversations: readonly PhoneConversation[],
  open: PhoneConversation | undefined,
  isOptedOut: boolean,
): Html {
  const rows = conversations.map((conversation) => phoneRow(conversation, conversation === open));
  const list =
    rows.length === 0
      ? html`<p class="quiet">No phone has a text yet. Ask someone for consent in the app, and the phone shows up here.</p>`
      : html`<ul class="rows">${rows}</ul>`;
  const head = html`<div class="pick"><h1>Phones</h1><p class="quiet">Pick a phone to read its texts and to answer.</p></div>`;
  return html`${open === undefined ? head : nothing}
<section class="list" aria-label="Phones" id="list" data-live>${list}</section>
${open === undefined ? nothing : openPhone(open, isOptedOut)}`;
}

function phoneRow(conversation: PhoneConversation, isOpen: boolean): Html {
  const last = conversation.texts.at(-1);
  return html`<li><a class="row" href="${conversationPath(conversation)}" ${isOpen ? html`aria-current="true"` : nothing}>
  <span class="top"><strong>${conversation.name}</strong>${last === undefined ? nothing : html`<span class="quiet">${writeTime(last.createdAt)}</span>`}</span>
  <span class="quiet">${conversation.phone} with ${conversation.number}</span>
  <span class="cut">${last === undefined ? 'No texts yet' : last.body}</span>
</a></li>`;
}

function openPhone(open: PhoneConversation, isOptedOut: boolean): Html {
  return html`<section class="phone" aria-label="Phone of ${open.name}">
  <header>
    <a class="back" href="/phones">All phones</a>
    <h1>${open.name}</h1>
    <p class="quiet">${open.phone} with the shop's number ${open.number}</p>
  </header>
  <div class="talk" id="talk" role="log" aria-label="Texts" tabindex="0" data-live>
    ${open.texts.map(bubble)}
    ${open.texts.length === 0 ? html`<p class="quiet">No texts yet. Whatever you write goes to the shop's number.</p>` : nothing}
    ${isOptedOut ? html`<p class="note">This phone has opted out. Nothing more reaches it until it texts START.</p>` : nothing}
  </div>
  <form class="answer" method="post" action="${conversationPath(open)}">
    <label for="body">Answer as ${open.name}</label>
    <textarea id="body" name="body" rows="1" maxlength="1600" required autocomplete="off"></textarea>
    <button class="main" type="submit">Send</button>
  </form>
</section>`;
}

function bubble(text: KeptText): Html {
  const kind = { inbound: 'mine', 'outbound-api': 'theirs', 'outbound-reply': 'carrier' }[text.direction];
  const origin = text.direction === 'outbound-reply' ? html`from the text service itself, ` : nothing;
  return html`<div class="bubble ${kind}">
  <div class="words">${linkAddresses(text.body)}</div>
  <p class="quiet">${origin}${writeTime(text.createdAt)}, ${statusWords[text.status]}${text.errorCode === null ? nothing : html` (${text.errorCode})`}. ${describeSegments(text.body)}</p>
</div>`;
}

function describeSegments(body: string): string {
  const { segments, units, encoding } = countSegments(body);
  const letters = encoding === 'seven-bit' ? 'plain letters' : 'marked letters';
  return `${units} ${letters}, ${segments} ${segments === 1 ? 'segment' : 'segments'}`;
}
