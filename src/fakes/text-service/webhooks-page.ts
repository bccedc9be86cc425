import { writeTime } from '../page/frame.ts';
import { type Html, html, nothing } from '../page/html.ts';
import type { Faults } from './faults.ts';
import type { Delivery } from './kept-texts.ts';

const shownDeliveries = 100;

const outcomeWords: Readonly<Record<Delivery['outcome'], Html>> = {
  'under way': html`under way`,
  taken: html`<span class="fine">taken</span>`,
  refused: html`<span class="bad">refused</span>`,
  missed: html`<span class="late">missed</span>`,
};

/** What the text service told the product, newest first, and whether it was heard. */
export function webhooksPage(deliveries: readonly Delivery[], faults: Faults): Html {
  const shown = deliveries.slice(-shownDeliveries).reverse();
  const isOff = faults.webhooks === 'off';
  return html`<h1>Webhooks</h1>
<p>Each text that comes in, and each change of one that went out, is told to the app once. A missed one is not told again: the app finds it by asking.</p>
<form method="post" action="/webhooks/${isOff ? 'on' : 'off'}"><button type="submit">${isOff ? 'Turn webhooks on' : 'Turn webhooks off'}</button></form>
<div id="deliveries" data-live>
  ${isOff ? html`<p class="note">Webhooks are off. The app hears nothing until it asks.</p>` : nothing}
  ${shown.length === 0 ? html`<p class="quiet">Nothing yet. Answer a text on the Phones page.</p>` : html`<ul class="rows">${shown.map(row)}</ul>`}
</div>`;
}

function row(delivery: Delivery): Html {
  const { MessageStatus, Body, MessageSid } = delivery.parameters;
  const what =
    delivery.kind === 'inbound'
      ? html`Text came in: ${Body ?? ''}`
      : html`Text is now ${MessageStatus ?? ''}`;
  return html`<li class="row delivery">
  <div>
    <span class="top"><strong>${what}</strong><span class="quiet">${writeTime(delivery.at)}</span></span>
    <p class="quiet"><code>${MessageSid ?? ''}</code></p>
    <p>${outcomeWords[delivery.outcome]}${delivery.httpStatus === null ? nothing : html`, answer ${delivery.httpStatus}`}</p>
  </div>
  <form method="post" action="/webhooks/${delivery.number}/again"><button type="submit">Tell again</button></form>
</li>`;
}
