import type { z } from 'zod';
import type { FieldProblem } from '../../i18n/field-codes.ts';
import { fieldProblems } from '../../i18n/field-problems.ts';
import { AppError } from '../errors.ts';

/** What a plain form sent: its answers, or what is wrong with them beside what was typed. */
export type FormReading<Output> =
  | { data: Output; typed: Record<string, string>; problems: [] }
  | { data: null; typed: Record<string, string>; problems: FieldProblem[] };

const formTypes = /^(application\/x-www-form-urlencoded|multipart\/form-data)\b/i;

/**
 * Reads the text fields of a plain form. A field that occurs once is a text, one that may occur several times (`lists`) is
 * a list of texts. `typed` is for showing the form again; a page never shows a password from it.
 * @throws AppError `wrong-content-type` when the body is no form, `malformed` when it cannot be read as one
 */
export async function readForm<Output>(
  request: Request,
  schema: z.ZodType<Output>,
  lists: readonly string[] = [],
): Promise<FormReading<Output>> {
  if (!formTypes.test(request.headers.get('content-type') ?? '')) throw new AppError('wrong-content-type');
  const form = await request.formData().catch((cause: unknown) => {
    throw new AppError('malformed', { cause });
  });
  const typed: Record<string, string> = {};
  const answers: Record<string, string | string[]> = {};
  for (const name of lists) answers[name] = [];
  for (const [name, value] of form) {
    if (typeof value !== 'string') continue;
    const list = answers[name];
    if (Array.isArray(list)) list.push(value);
    else {
      typed[name] = value;
      answers[name] = value;
    }
  }
  const parsed = schema.safeParse(answers, { reportInput: true });
  if (parsed.success) return { data: parsed.data, typed, problems: [] };
  return { data: null, typed, problems: fieldProblems(parsed.error) };
}

/** The problem of one field by its name, if it has one. */
export function problemAt(problems: readonly FieldProblem[], field: string): FieldProblem | undefined {
  return problems.find((problem) => problem.pointer === `#/${field}`);
}
