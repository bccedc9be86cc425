import type { JsonSchema } from '../pack/json-schema.ts';

/** One field of what is sent or answered, as a reader of the API page needs it. */
export interface DescribedField {
  /** With dots where it stands inside another: `trial.machine`. */
  name: string;
  /** `string`, `number[]`, `"draft" | "running"`: as JSON has it. */
  type: string;
  required: boolean;
}

type Schemas = Readonly<Record<string, JsonSchema>>;

/** Fields within fields are shown so far; what lies deeper stands in the document. */
const deepest = 2;
const mostLetters = 80;

function follow(schemas: Schemas, schema: JsonSchema): JsonSchema {
  const place = '#/components/schemas/';
  if (schema.$ref === undefined || !schema.$ref.startsWith(place)) return schema;
  const steps = schema.$ref.slice(place.length).split('/');
  // A walk through plain JSON that the same process wrote.
  const found = steps.reduce<unknown>((at, step) => (at as Schemas | undefined)?.[step], schemas);
  return found === undefined ? schema : follow(schemas, found as JsonSchema);
}

function nameType(schemas: Schemas, given: JsonSchema): string {
  const schema = follow(schemas, given);
  if (schema.const !== undefined) return JSON.stringify(schema.const);
  if (schema.enum) return schema.enum.map((each) => JSON.stringify(each)).join(' | ');
  const choices = schema.anyOf ?? schema.oneOf;
  if (choices) return [...new Set(choices.map((each) => nameType(schemas, each as JsonSchema)))].join(' | ');
  if (schema.type === 'array' && typeof schema.items === 'object' && !Array.isArray(schema.items)) {
    const inner = nameType(schemas, schema.items as JsonSchema);
    return inner.includes(' ') ? `(${inner})[]` : `${inner}[]`;
  }
  return Array.isArray(schema.type) ? schema.type.join(' | ') : (schema.type ?? 'any');
}

function shorten(text: string): string {
  return text.length > mostLetters ? `${text.slice(0, mostLetters - 1)}…` : text;
}

/** The object that lists of it and it alone have in common. */
function innerObject(schemas: Schemas, given: JsonSchema): JsonSchema | null {
  const schema = follow(schemas, given);
  if (schema.properties) return schema;
  const isList = schema.type === 'array' && typeof schema.items === 'object' && !Array.isArray(schema.items);
  return isList ? innerObject(schemas, schema.items as JsonSchema) : null;
}

/** The fields of a schema of the document, nearest first. Empty for what is no object. */
export function describeFields(
  schemas: Schemas,
  schema: JsonSchema | undefined,
  before = '',
  depth = 0,
): DescribedField[] {
  const object = schema && innerObject(schemas, schema);
  if (!object) return [];
  const required = new Set(object.required ?? []);
  return Object.entries(object.properties ?? {}).flatMap(([name, given]) => {
    if (typeof given === 'boolean') return [];
    const full = `${before}${name}`;
    const field = { name: full, type: shorten(nameType(schemas, given)), required: required.has(name) };
    const inner = depth + 1 < deepest ? describeFields(schemas, given, `${full}.`, depth + 1) : [];
    return [field, ...inner];
  });
}
