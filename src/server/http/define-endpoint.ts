import type { APIContext, APIRoute } from 'astro';
import { z } from 'zod';
import type { Permission } from '../auth/permissions.ts';
import { requirePermission, scopeOf, type Viewer } from '../auth/viewer.ts';
import type { ShopScope } from '../db/scope.ts';
import { AppError } from '../errors.ts';
import { describeError, log } from '../log.ts';
import { fieldProblems } from './field-problems.ts';
import { problemResponse, toAppError } from './problem.ts';

/**
 * Who may call: a permission; `signed-in` for what belongs to the caller alone; `public`; or `signed`, where the handler
 * itself checks the text service's signature.
 */
export type Access = Permission | 'signed-in' | 'public' | 'signed';

interface Declaration<Params, Query, Body, Output> {
  access: Access;
  params?: z.ZodType<Params>;
  query?: z.ZodType<Query>;
  /** The JSON body. Without it the endpoint reads no body itself. */
  body?: z.ZodType<Body>;
  /** Names each public field: whatever else a service returns does not leave the house. */
  output: z.ZodType<Output>;
  status?: number;
  /** What it answers with, where that is no JSON. */
  mediaType?: string;
  /** Whether a program may call it with a person's token; without it only a session opens it. */
  byToken?: boolean;
}

interface Call<Params, Query, Body> {
  viewer: Viewer | null;
  params: Params;
  query: Query;
  body: Body;
  context: APIContext;
}

/** A call behind a permission: there is a person, and the shop's scope. */
interface SignedInCall<Params, Query, Body> extends Call<Params, Query, Body> {
  viewer: Viewer;
  scope: ShopScope;
}

/** An endpoint with its declaration, which the OpenAPI document and the permission tests read. */
export type Endpoint = APIRoute & { declaration: Declaration<unknown, unknown, unknown, unknown> };

function parse<Output>(schema: z.ZodType<Output> | undefined, input: unknown): Output {
  if (!schema) return undefined as Output;
  const parsed = schema.safeParse(input, { reportInput: true });
  if (!parsed.success) throw new AppError('invalid', { fields: fieldProblems(parsed.error) });
  return parsed.data;
}

async function readJson(request: Request): Promise<unknown> {
  const contentType = request.headers.get('content-type') ?? '';
  if (!/^application\/json\b/i.test(contentType)) throw new AppError('wrong-content-type');
  try {
    return await request.json();
  } catch (cause) {
    throw new AppError('malformed', { cause });
  }
}

async function answer<Params, Query, Body, Output>(
  declaration: Declaration<Params, Query, Body, Output>,
  handle: (call: Call<Params, Query, Body>) => Promise<Output | Response>,
  context: APIContext,
): Promise<Response> {
  const call = {
    viewer: context.locals.viewer,
    params: parse(declaration.params, context.params),
    query: parse(declaration.query, Object.fromEntries(context.url.searchParams)),
    body: declaration.body ? parse(declaration.body, await readJson(context.request)) : (undefined as Body),
    context,
  };
  const result = await handle(call);
  if (result instanceof Response) return result;
  const output = declaration.output.parse(result);
  if (output === undefined) return new Response(null, { status: declaration.status ?? 204 });
  return Response.json(output, {
    status: declaration.status ?? 200,
    headers: { 'Cache-Control': 'no-store' },
  });
}

function endpoint<Params, Query, Body, Output>(
  declaration: Declaration<Params, Query, Body, Output>,
  handle: (call: Call<Params, Query, Body>) => Promise<Output | Response>,
): Endpoint {
  const route: APIRoute = async (context) => {
    try {
      return await answer(declaration, handle, context);
    } catch (thrown) {
      const error = toAppError(thrown);
      const { requestId, t } = context.locals;
      if (error.status >= 500) {
        log.error({ event: 'request-failed', requestId, error: describeError(error.cause ?? error) });
      }
      return problemResponse(error, t, requestId);
    }
  };
  return Object.assign(route, { declaration });
}

/** An endpoint for people who are signed in: the permission is checked before anything is read. */
export function defineEndpoint<Output, Params = undefined, Query = undefined, Body = undefined>(
  declaration: Declaration<Params, Query, Body, Output> & { access: Permission | 'signed-in' },
  handle: (call: SignedInCall<Params, Query, Body>) => Promise<Output | Response>,
): Endpoint {
  const guarded = endpoint(declaration, (call) => {
    const viewer = allowed(call.viewer, declaration);
    return handle({ ...call, viewer, scope: scopeOf(viewer) });
  });
  const route: APIRoute = (context) => {
    try {
      allowed(context.locals.viewer, declaration);
    } catch (thrown) {
      return problemResponse(toAppError(thrown), context.locals.t, context.locals.requestId);
    }
    return guarded(context);
  };
  return Object.assign(route, { declaration: guarded.declaration });
}

function allowed(
  viewer: Viewer | null,
  { access, byToken = false }: { access: Permission | 'signed-in'; byToken?: boolean | undefined },
): Viewer {
  if (!viewer) throw new AppError('not-signed-in');
  if (viewer.sessionHandle === null && !byToken) {
    throw new AppError('forbidden', { detail: 'not for tokens' });
  }
  return access === 'signed-in' ? viewer : requirePermission(viewer, access);
}

/** An endpoint that anybody may call, or that checks a signature itself. */
export function defineOpenEndpoint<Output, Params = undefined, Query = undefined, Body = undefined>(
  declaration: Declaration<Params, Query, Body, Output> & { access: 'public' | 'signed' },
  handle: (call: Call<Params, Query, Body>) => Promise<Output | Response>,
): Endpoint {
  return endpoint(declaration, handle);
}

/** For endpoints that answer 204. */
export const nothing = z.undefined();
