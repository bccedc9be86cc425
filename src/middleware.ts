import { defineMiddleware, sequence } from 'astro:middleware';
import { recogniseViewer } from './server/auth/recognise-viewer.ts';
import { AppError } from './server/errors.ts';
import { isFromOurPages } from './server/http/origin.ts';
import { problemResponse, toAppError } from './server/http/problem.ts';
import { greetReader } from './server/http/reader.ts';
import { newId } from './server/ids.ts';
import { describeError, log } from './server/log.ts';

function isApi(path: string): boolean {
  return path.startsWith('/api/');
}

function readingHeaders(request: Request): Headers {
  const headers = new Headers(request.headers);
  headers.delete('content-length');
  headers.delete('content-type');
  return headers;
}

const nameRequest = defineMiddleware(async (context, next) => {
  // A page that refuses is rewritten to another one, which comes through here again.
  if (context.locals.refusal) return next();
  const began = performance.now();
  const requestId = newId();
  Object.assign(context.locals, { requestId, viewer: null, refusal: null });
  greetReader(context, null);
  const response = await next();
  response.headers.set('X-Request-Id', requestId);
  if (response.headers.get('content-type') === 'text/html') {
    response.headers.set('Content-Type', 'text/html; charset=utf-8');
    // On a shared computer the button "back" must not show the page of whoever signed out.
    // Nor may it keep a page for good by itself, as browsers do with a 410: the reader's language changes, links end.
    response.headers.set('Cache-Control', context.locals.viewer ? 'no-store' : 'no-cache');
  }
  log.info({
    event: 'request',
    requestId,
    method: context.request.method,
    route: context.routePattern,
    status: response.status,
    milliseconds: Math.round(performance.now() - began),
  });
  return response;
});

/** A refusal thrown by a page or a step below becomes problem details for programs and a page for people. */
const explainRefusals = defineMiddleware(async (context, next) => {
  try {
    return await next();
  } catch (thrown) {
    const error = toAppError(thrown);
    const { requestId, t } = context.locals;
    if (error.status >= 500) {
      log.error({ event: 'request-failed', requestId, error: describeError(error.cause ?? error) });
    }
    if (isApi(context.url.pathname)) return problemResponse(error, t, requestId);
    if (error.code === 'not-signed-in' && context.request.method === 'GET') {
      const back = `${context.url.pathname}${context.url.search}`;
      return context.redirect(`/sign-in?next=${encodeURIComponent(back)}`, 303);
    }
    context.locals.refusal = error;
    // A new request, as the body of this one may have been read already.
    return context.rewrite(
      new Request(new URL('/refused', context.url), { headers: readingHeaders(context.request) }),
    );
  }
});

const checkOrigin = defineMiddleware((context, next) => {
  if (!isFromOurPages(context.request, context.url.pathname)) throw new AppError('foreign-origin');
  return next();
});

const greetViewer = defineMiddleware(async (context, next) => {
  const viewer = await recogniseViewer(context);
  if (!viewer) return next();
  context.locals.viewer = viewer;
  greetReader(context, viewer);
  return next();
});

export const onRequest = sequence(nameRequest, explainRefusals, checkOrigin, greetViewer);
