import type { SharedClock } from '../clock.ts';
import { type Html, html, nothing } from './html.ts';

const places = [
  { path: '/phones', name: 'Phones' },
  { path: '/mail', name: 'Mail' },
  { path: '/webhooks', name: 'Webhooks' },
] as const;

const hourMilliseconds = 3_600_000;

/**
 * The frame around each page of the stand-ins. What is marked `data-live` inside `content` refreshes by itself.
 * These pages are for demo visitors and developers and speak English only.
 */
export function pageFrame(options: { title: string; path: string; clock: SharedClock; content: Html }): Html {
  const { title, path, clock, content } = options;
  const links = places.map((place) => {
    const current = path.startsWith(place.path) ? html`aria-current="page"` : nothing;
    return html`<a href="${place.path}" ${current}>${place.name}</a>`;
  });
  return html`<html lang="en">
<head>
  <meta charset="utf-8">
  <meta name="viewport" content="width=device-width, initial-scale=1">
  <title>${title}: the demo's phones and mail</title>
  <link rel="stylesheet" href="/fakes.css">
  <script src="/refresh.js" defer></script>
</head>
<body>
  <header class="bar">
    <nav aria-label="Demo">${links}</nav>
    <form class="clock" method="post" action="/clock/hour">
      <span id="clock" data-live>${writeTime(clock.now())}${describeOffset(clock.offset())}</span>
      <input type="hidden" name="back" value="${path}">
      <button type="submit">An hour later</button>
    </form>
  </header>
  <main class="${path.startsWith('/phones') ? 'phones' : 'sheet'}">${content}</main>
</body>
</html>`;
}

function describeOffset(offset: number): string {
  if (offset === 0) return '';
  const hours = Math.round((Math.abs(offset) / hourMilliseconds) * 10) / 10;
  return ` (${hours} h ${offset > 0 ? 'ahead' : 'behind'})`;
}

const timeFormat = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'short',
  hour: '2-digit',
  minute: '2-digit',
});

/** Day and time as this machine's zone has them. */
export function writeTime(at: number): string {
  return timeFormat.format(at);
}
