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

/** How a posted form was answered: by a response, or by showing it again with what is wrong. */
export interface FormAnswer {
  response: Response | null;
  typed: Record<string, string>;
  problems: readonly FieldProblem[];
  /** A refusal of the whole form that its page explains: too many tries. */
  refusal: AppError | null;
}

/** What a page shows before anything was posted. */
export const untouchedForm: FormAnswer = { response: null, typed: {}, problems: [], refusal: null };

/**
 * Reads a posted form and lets `use` answer it. Faults in its fields, found by the schema or by `use`, and too many tries
 * come back for the page to show; every other refusal is thrown on.
 */
export async function answerForm<Output>(
  request: Request,
  schema: z.ZodType<Output>,
  use: (data: Output) => Promise<Response>,
): Promise<FormAnswer> {
  const { data, typed, problems } = await readForm(request, schema);
  if (data === null) return { response: null, typed, problems, refusal: null };
  try {
    return { response: await use(data), typed, problems: [], refusal: null };
  } catch (thrown) {
    if (!(thrown instanceof AppError)) throw thrown;
    if (thrown.code === 'too-many') return { response: null, typed, problems: [], refusal: thrown };
    if (thrown.fields.length === 0) throw thrown;
    return { response: null, typed, problems: thrown.fields, refusal: null };
  }
}

/** The status and headers of a page that shows a form again. */
export function markAnswer(response: { status?: number; headers: Headers }, answer: FormAnswer): void {
  if (answer.problems.length > 0) response.status = 422;
  if (!answer.refusal) return;
  response.status = answer.refusal.status;
  response.headers.set('Retry-After', String(answer.refusal.retryAfterSeconds ?? 60));
}

/** Minutes to wait, rounded up, for the sentence about too many tries. */
export function minutesToWait(refusal: AppError): number {
  return Math.ceil((refusal.retryAfterSeconds ?? 60) / 60);
}

/** What `work` gives; null where it is refused because a link has ended, which the page of the link explains itself. */
export async function nullWhenGone<Result>(work: Promise<Result>): Promise<Result | null> {
  try {
    return await work;
  } catch (thrown) {
    if (thrown instanceof AppError && thrown.code === 'gone') return null;
    throw thrown;
  }
}
