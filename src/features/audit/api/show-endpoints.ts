import type { JsonSchema } from '../pack/json-schema.ts';
import { type DescribedField, describeFields } from './describe-fields.ts';
import type { writeOpenApi } from './openapi.ts';

/** One call of the API as the page shows it. */
export interface ShownEndpoint {
  id: string;
  method: string;
  path: string;
  permission: string;
  byToken: boolean;
  /** What stands in the address, and behind its question mark. */
  parameters: readonly DescribedField[];
  body: readonly DescribedField[];
  answer: readonly DescribedField[];
  /** A call as a terminal takes it. */
  example: string;
}

type Document = ReturnType<typeof writeOpenApi>;

/** What this page reads of an operation of the document. */
interface Operation {
  operationId: string;
  'x-permission': string;
  security: readonly Readonly<Record<string, unknown>>[];
  parameters?: readonly { name: string; required: boolean; schema: JsonSchema }[];
}

function showOperation(
  document: Document,
  path: string,
  method: string,
  operation: Operation,
): ShownEndpoint {
  const { schemas } = document.components;
  const id = operation.operationId;
  const byToken = operation.security.some((way) => 'token' in way);
  const address = `${document.servers[0]?.url ?? ''}${path}`;
  return {
    id,
    method: method.toUpperCase(),
    path,
    permission: operation['x-permission'],
    byToken,
    parameters: (operation.parameters ?? []).map(({ name, required, schema }) => ({
      name,
      required,
      type: typeof schema.type === 'string' ? schema.type : 'string',
    })),
    body: describeFields(schemas, schemas[`${id}Body`]),
    answer: describeFields(schemas, schemas[`${id}Answer`]),
    example: `curl -H 'Authorization: Bearer trywell_…' '${address}'`,
  };
}

/** The calls of the document in its order, those whose address or permission holds the words that somebody looks for. */
export function showEndpoints(document: Document, find: string): ShownEndpoint[] {
  const wanted = find.trim().toLowerCase();
  const all = Object.entries(document.paths).flatMap(([path, methods]) =>
    Object.entries(methods).map(([method, operation]) =>
      // Written by `writeOpenApi` in the same request.
      showOperation(document, path, method, operation as Operation),
    ),
  );
  return all.filter(({ method, path, permission }) =>
    `${method} ${path} ${permission}`.toLowerCase().includes(wanted),
  );
}
