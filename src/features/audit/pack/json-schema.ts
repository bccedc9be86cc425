import { z } from 'zod';
import { verdictFactsSchema } from '../../verdict/stored-verdict.ts';
import { shapeOf } from './kept.ts';
import { trialFileSchema } from './trial-file.schema.ts';

export type JsonSchema = z.core.JSONSchema.BaseSchema;

/** Described once and pointed at, as many places speak of them. */
export const sharedSchemas: Record<string, z.ZodType> = {
  VerdictFacts: verdictFactsSchema,
  TrialFile: trialFileSchema,
};

/**
 * Zod schemas as JSON Schema 2020-12 that stand together under one place of a document and point at each other.
 * @param place where they will stand, e.g. `#/$defs/`
 */
export function writeJsonSchemas(
  named: Readonly<Record<string, z.ZodType>>,
  { io, place }: { io: 'input' | 'output'; place: string },
): Record<string, JsonSchema> {
  const registry = z.registry<{ id: string }>();
  for (const [id, schema] of Object.entries(named)) registry.add(schema, { id });
  const { schemas } = z.toJSONSchema(registry, {
    io,
    unrepresentable: 'any',
    reused: 'ref',
    uri: (id) => `${place}${id}`,
    override({ zodSchema, jsonSchema }) {
      const shape = shapeOf(zodSchema);
      const id = shape && registry.get(shape)?.id;
      if (id !== undefined) Object.assign(jsonSchema, { $ref: `${place}${id}` });
    },
  });
  const bare = Object.fromEntries(
    Object.entries(schemas).map(([id, { $schema: _, $id: __, ...schema }]) => [id, schema]),
  );
  // What several of them share stands in one more of them, which is no document of its own here.
  return JSON.parse(JSON.stringify(bare).replaceAll(`${place}__shared#/`, `${place}__shared/`));
}

/** trial.json's own description, as a document by itself. */
export function writeTrialFileSchema(): JsonSchema {
  const $defs = writeJsonSchemas(sharedSchemas, { io: 'input', place: '#/$defs/' });
  return { $schema: 'https://json-schema.org/draft/2020-12/schema', $ref: '#/$defs/TrialFile', $defs };
}
