import { z } from 'zod';
import { shapeOf } from './kept.ts';

type JsonSchema = z.core.JSONSchema.BaseSchema;

/** A zod schema as JSON Schema 2020-12, as the one who sends or reads the data sees it. */
export function toJsonSchema(schema: z.ZodType, io: 'input' | 'output'): JsonSchema {
  return z.toJSONSchema(schema, {
    io,
    unrepresentable: 'any',
    override({ zodSchema, jsonSchema }) {
      const shape = shapeOf(zodSchema);
      if (!shape) return;
      const { $schema: _, ...inner } = toJsonSchema(shape, io);
      Object.assign(jsonSchema, inner);
    },
  });
}
