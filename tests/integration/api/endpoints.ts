import type { APIContext, APIRoute } from 'astro';
import { translatorFor } from '../../../src/i18n/translator.ts';
import type { Viewer } from '../../../src/server/auth/viewer.ts';
import type { Access, Endpoint } from '../../../src/server/http/define-endpoint.ts';

const methods = ['GET', 'POST', 'PUT', 'PATCH', 'DELETE', 'ALL'] as const;
type Method = (typeof methods)[number];

export interface KnownEndpoint {
  method: Method;
  /** As its file lies in `pages`, e.g. `/api/people/[id]/invite`. */
  path: string;
  route: APIRoute;
  /** Undefined where an endpoint was written without a declaration. */
  access: Access | undefined;
}

const modules = import.meta.glob<Record<string, APIRoute>>('../../../src/pages/api/**/*.ts', { eager: true });

function pathOf(file: string): string {
  const path = file.slice(file.indexOf('/api/')).replace(/\.ts$/, '');
  return path.replace(/\/index$/, '');
}

/** Every endpoint there is under /api, with whatever it declares. */
export const endpoints: KnownEndpoint[] = Object.entries(modules).flatMap(([file, module]) =>
  methods.flatMap((method) => {
    const route = module[method];
    if (!route) return [];
    const { declaration } = route as Partial<Endpoint>;
    return [{ method, path: pathOf(file), route, access: declaration?.access }];
  }),
);

export interface Attempt {
  viewer: Viewer | null;
  params?: Record<string, string>;
  body?: { type: string; text: string } | undefined;
  /** What stands behind the question mark of the address. */
  query?: string | undefined;
  headers?: Record<string, string>;
}

/** Calls an endpoint as a visitor, without the network; the session is taken as read. */
export async function attempt(endpoint: KnownEndpoint, visit: Attempt): Promise<Response> {
  const method = endpoint.method === 'ALL' ? 'GET' : endpoint.method;
  const path = endpoint.path.replace(/\[(?:\.\.\.)?(\w+)\]/g, (_, name) => visit.params?.[name] ?? 'nothing');
  const url = new URL(path, 'http://127.0.0.1:4310');
  const { body, query, headers = {} } = visit;
  if (query) url.search = query;
  const request = new Request(url, {
    method,
    headers: body && method !== 'GET' ? { ...headers, 'content-type': body.type } : headers,
    ...(body && method !== 'GET' ? { body: body.text } : {}),
  });
  const context = {
    request,
    url,
    params: visit.params ?? {},
    locals: { viewer: visit.viewer, requestId: 'test', language: 'en', t: translatorFor('en') },
    cookies: { get: () => undefined, set: () => undefined, delete: () => undefined },
    clientAddress: '127.0.0.1',
  };
  return endpoint.route(context as unknown as APIContext);
}
