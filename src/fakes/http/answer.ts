import type { IncomingHttpHeaders } from 'node:http';
import type { Html } from '../page/html.ts';

/** What came in: the path is matched, its captured parts stand in `parts`, decoded. */
export interface Ask {
  method: string;
  url: URL;
  parts: string[];
  headers: IncomingHttpHeaders;
  body: string;
}

export interface Answer {
  status: number;
  type: string;
  body: string | Uint8Array;
  headers?: Record<string, string>;
}

/** The request stays open without a word, as a service that has died behind its door. */
export const noAnswer = Symbol('no answer');

export type Handler = (ask: Ask) => Answer | typeof noAnswer | Promise<Answer | typeof noAnswer>;

export interface Route {
  method: 'GET' | 'POST' | 'DELETE';
  /** Matched against the whole path. */
  path: RegExp;
  handle: Handler;
  /** The text service's API is called by programs; everything else only from the pages or a test. */
  caller: 'program' | 'page';
}

export function jsonAnswer(value: unknown, status = 200, headers: Record<string, string> = {}): Answer {
  return { status, type: 'application/json; charset=utf-8', body: JSON.stringify(value), headers };
}

export function pageAnswer(page: Html, status = 200): Answer {
  return { status, type: 'text/html; charset=utf-8', body: `<!doctype html>${page.markup}` };
}

/** After a form: sends the browser to a page by GET, so that reloading does not send the form again. */
export function seeOther(path: string): Answer {
  return { status: 303, type: 'text/plain; charset=utf-8', body: '', headers: { location: path } };
}
