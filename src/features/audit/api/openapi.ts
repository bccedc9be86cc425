import { z } from 'zod';
import { fieldCodes } from '../../../i18n/field-codes.ts';
import type { Translate } from '../../../i18n/translator.ts';
import { type JsonSchema, sharedSchemas, writeJsonSchemas } from '../pack/json-schema.ts';

/** An endpoint as its file declares it. */
export interface DescribedEndpoint {
  method: string;
  /** As its file lies in `pages`, e.g. `/api/people/[id]/invite`. */
  path: string;
  declaration: {
    access: string;
    params?: z.ZodType | undefined;
    query?: z.ZodType | undefined;
    body?: z.ZodType | undefined;
    output: z.ZodType;
    status?: number | undefined;
    mediaType?: string | undefined;
    byToken?: boolean | undefined;
  };
}

const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number(),
  code: z.string(),
  detail: z.string(),
  requestId: z.string(),
  errors: z.array(z.object({ pointer: z.string(), code: z.enum(fieldCodes), detail: z.string() })).optional(),
  present: z.unknown().optional(),
});

const place = '#/components/schemas/';

/** `GET /api/runs/[id]/events` as one word: `getRunsIdEvents`. */
export function nameOperation({ method, path }: Pick<DescribedEndpoint, 'method' | 'path'>): string {
  const parts = path
    .replace(/^\/api/, '')
    .split(/[^a-z]+/i)
    .filter(Boolean);
  const words = parts.map((part) => part.charAt(0).toUpperCase() + part.slice(1));
  return `${method.toLowerCase()}${words.join('')}`;
}

const pathOf = (path: string) => path.replace(/\[\.{0,3}(\w+)\]/g, '{$1}');

/** The schema itself, where it only points at another. */
function follow(schemas: Record<string, JsonSchema>, schema: JsonSchema | undefined): JsonSchema | undefined {
  const ref = schema?.$ref;
  if (ref === undefined) return schema;
  const steps = ref.slice(place.length).split('/');
  // A walk through plain JSON that was just written.
  const found = steps.reduce<unknown>(
    (at, step) => (at as Record<string, unknown> | undefined)?.[step],
    schemas,
  );
  return follow(schemas, found as JsonSchema | undefined);
}

function parametersOf(schema: JsonSchema | undefined, where: 'path' | 'query') {
  const required = new Set(schema?.required ?? []);
  return Object.entries(schema?.properties ?? {}).map(([name, described]) => ({
    name,
    in: where,
    required: where === 'path' || required.has(name),
    schema: described,
  }));
}

function securityOf({ access, byToken }: DescribedEndpoint['declaration']): Record<string, never[]>[] {
  if (access === 'public' || access === 'signed') return [];
  return [...(byToken ? [{ token: [] }] : []), { session: [] }];
}

const isNothing = (schema: z.ZodType) => schema instanceof z.ZodUndefined;
const hasShape = (schema: z.ZodType) => !(schema instanceof z.ZodUnknown) && !isNothing(schema);

function answersOf(endpoint: DescribedEndpoint): Record<string, unknown> {
  const { output, status, mediaType } = endpoint.declaration;
  const schema = hasShape(output) ? { $ref: `${place}${nameOperation(endpoint)}Answer` } : {};
  const content = isNothing(output) ? {} : { content: { [mediaType ?? 'application/json']: { schema } } };
  const refusal = { 'application/problem+json': { schema: { $ref: `${place}Problem` } } };
  const done = String(status ?? (isNothing(output) ? 204 : 200));
  return {
    [done]: { description: done, ...content },
    default: { description: 'RFC 9457', content: refusal },
  };
}

function writeOperation(endpoint: DescribedEndpoint, schemas: Record<string, JsonSchema>) {
  const { declaration } = endpoint;
  const name = nameOperation(endpoint);
  const parameters = [
    ...parametersOf(follow(schemas, schemas[`${name}Params`]), 'path'),
    ...parametersOf(follow(schemas, schemas[`${name}Query`]), 'query'),
  ];
  return {
    operationId: name,
    tags: [endpoint.path.split('/')[2] ?? ''],
    'x-permission': declaration.access,
    security: securityOf(declaration),
    ...(parameters.length > 0 ? { parameters } : {}),
    ...(declaration.body
      ? {
          requestBody: {
            required: true,
            content: { 'application/json': { schema: { $ref: `${place}${name}Body` } } },
          },
        }
      : {}),
    responses: answersOf(endpoint),
  };
}

/** The schemas of some part of each endpoint, by the name of its operation. */
function collect(
  endpoints: readonly DescribedEndpoint[],
  part: 'params' | 'query' | 'body' | 'output',
  as: string,
) {
  const found = endpoints.flatMap((endpoint): [string, z.ZodType][] => {
    const schema = endpoint.declaration[part];
    // A schema that stands under a name of its own is pointed at by that.
    return schema && hasShape(schema) ? [[`${nameOperation(endpoint)}${as}`, schema.clone()]] : [];
  });
  return Object.fromEntries(found);
}

/** Every endpoint that declares itself as an OpenAPI 3.1 document. */
export function writeOpenApi(
  endpoints: readonly DescribedEndpoint[],
  { t, server }: { t: Translate; server: string },
) {
  const schemas = writeJsonSchemas(
    {
      ...sharedSchemas,
      Problem: problemSchema,
      ...collect(endpoints, 'params', 'Params'),
      ...collect(endpoints, 'query', 'Query'),
      ...collect(endpoints, 'body', 'Body'),
      ...collect(endpoints, 'output', 'Answer'),
    },
    // What is answered has passed its schema as well, so that it reads as what could be sent.
    { io: 'input', place },
  );
  const paths: Record<string, Record<string, unknown>> = {};
  for (const endpoint of endpoints) {
    const path = pathOf(endpoint.path);
    paths[path] = { ...paths[path], [endpoint.method.toLowerCase()]: writeOperation(endpoint, schemas) };
  }
  return {
    openapi: '3.1.0',
    info: { title: t('audit-pack:api.title'), version: '1', description: t('audit-pack:api.note') },
    servers: [{ url: server }],
    paths,
    components: {
      schemas,
      securitySchemes: {
        token: { type: 'http', scheme: 'bearer' },
        session: { type: 'apiKey', in: 'cookie', name: 'session' },
      },
    },
  };
}
