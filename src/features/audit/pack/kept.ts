import { z } from 'zod';
import '../../people/schema-settings.ts';

const shapes = new WeakMap<object, z.ZodType>();

/**
 * Checks a value against a schema and hands it on exactly as it came: what was stored as evidence keeps the order of its
 * fields, and so its bytes.
 */
export function kept<Output>(shape: z.ZodType<Output>): z.ZodType<Output> {
  const schema = z.unknown().superRefine((value, context) => {
    const parsed = shape.safeParse(value, { reportInput: true });
    if (parsed.success) return;
    for (const issue of parsed.error.issues) context.addIssue({ ...issue });
  });
  shapes.set(schema, shape);
  // The value has just been checked against the shape, whose output is no other than its input.
  return schema as unknown as z.ZodType<Output>;
}

/** The schema behind a kept one, for whoever describes it. */
export function shapeOf(schema: object): z.ZodType | undefined {
  return shapes.get(schema);
}
