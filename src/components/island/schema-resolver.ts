import type { FieldErrors, FieldValues, Resolver } from 'react-hook-form';
import type { z } from 'zod';
import { type FieldProblem, fieldSentence } from '../../i18n/field-codes.ts';
import { fieldProblems } from '../../i18n/field-problems.ts';

type TranslateField = Parameters<typeof fieldSentence>[0];

/** Field problems as react-hook-form keeps them: the first of each field, under its place in the form. */
export function toFormErrors(
  problems: readonly FieldProblem[],
  t: TranslateField,
  fieldOf: (pointer: string) => string,
): Record<string, { type: string; message: string }> {
  const errors: Record<string, { type: string; message: string }> = {};
  for (const { pointer, code, values } of problems) {
    errors[fieldOf(pointer)] ??= { type: code, message: fieldSentence(t, code, values) };
  }
  return errors;
}

function nest(errors: Record<string, unknown>): Record<string, unknown> {
  const tree: Record<string, unknown> = {};
  for (const [path, error] of Object.entries(errors)) {
    const parts = path.split('.');
    const last = parts.pop() ?? '';
    let node = tree;
    for (const part of parts) {
      node[part] ??= {};
      node = node[part] as Record<string, unknown>;
    }
    node[last] = error;
  }
  return tree;
}

/**
 * Checks a form with the schema of its endpoint, so that both refuse the same, in the reader's language.
 * @param form.toInput the form's values as the endpoint asks for them
 * @param form.fieldOf the form's field behind a JSON pointer
 */
export function schemaResolver<Values extends FieldValues>(form: {
  schema: z.ZodType;
  toInput: (values: Values) => unknown;
  fieldOf: (pointer: string) => string;
  t: TranslateField;
}): Resolver<Values> {
  return (values) => {
    const parsed = form.schema.safeParse(form.toInput(values), { reportInput: true });
    if (parsed.success) return { values, errors: {} };
    const errors = toFormErrors(fieldProblems(parsed.error), form.t, form.fieldOf);
    return { values: {}, errors: nest(errors) as FieldErrors<Values> };
  };
}
