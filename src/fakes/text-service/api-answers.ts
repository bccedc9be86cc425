import type { KeptText } from './kept-texts.ts';

const defaultPageSize = 50;
const largestPageSize = 1000;

/** One text as the API describes it: snake case, dates as RFC 2822 to the second, counts as strings. */
export function describeForApi(text: KeptText, accountSid: string): Record<string, unknown> {
  return {
    sid: text.sid,
    account_sid: accountSid,
    api_version: '2010-04-01',
    body: text.body,
    date_created: writeDate(text.createdAt),
    date_sent: writeDate(text.createdAt),
    date_updated: writeDate(text.updatedAt),
    direction: text.direction,
    error_code: text.errorCode,
    error_message: null,
    from: text.from,
    messaging_service_sid: null,
    num_media: String(text.media.length),
    num_segments: String(text.segments),
    price: null,
    price_unit: 'USD',
    status: text.status,
    subresource_uris: {},
    to: text.to,
    uri: `/2010-04-01/Accounts/${accountSid}/Messages/${text.sid}.json`,
  };
}

function writeDate(at: number): string {
  return new Date(at).toUTCString().replace('GMT', '+0000');
}

/**
 * A page of texts, newest first, filtered by To, From and DateSent (a day), DateSent> and DateSent< (both inclusive,
 * to the second). Later pages are named by `next_page_uri`.
 */
export function listForApi(
  texts: readonly KeptText[],
  url: URL,
  accountSid: string,
): Record<string, unknown> {
  const found = texts.filter((text) => isWanted(text, url.searchParams)).reverse();
  const size = Math.min(Number(url.searchParams.get('PageSize') ?? defaultPageSize), largestPageSize);
  const page = Number(url.searchParams.get('Page') ?? 0);
  const from = page * size;
  const here = found.slice(from, from + size);
  return {
    messages: here.map((text) => describeForApi(text, accountSid)),
    page,
    page_size: size,
    start: from,
    end: from + here.length - 1,
    uri: url.pathname + url.search,
    first_page_uri: pageUri(url, 0, size),
    previous_page_uri: page === 0 ? null : pageUri(url, page - 1, size),
    next_page_uri: from + size < found.length ? pageUri(url, page + 1, size) : null,
  };
}

function pageUri(url: URL, page: number, size: number): string {
  const parameters = new URLSearchParams(url.searchParams);
  parameters.set('Page', String(page));
  parameters.set('PageSize', String(size));
  return `${url.pathname}?${parameters}`;
}

function isWanted(text: KeptText, filter: URLSearchParams): boolean {
  const second = Math.floor(text.createdAt / 1000) * 1000;
  const day = filter.get('DateSent')?.slice(0, 10);
  const after = readDate(filter.get('DateSent>'));
  const before = readDate(filter.get('DateSent<'));
  return (
    (filter.get('To') ?? text.to) === text.to &&
    (filter.get('From') ?? text.from) === text.from &&
    (day ?? isoDay(second)) === isoDay(second) &&
    (after ?? second) <= second &&
    (before ?? second) >= second
  );
}

function isoDay(at: number): string {
  return new Date(at).toISOString().slice(0, 10);
}

function readDate(written: string | null): number | undefined {
  const at = written === null ? Number.NaN : Date.parse(written);
  return Number.isNaN(at) ? undefined : at;
}
