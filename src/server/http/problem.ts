import { fieldSentence } from '../../i18n/field-codes.ts';
import type { Translate } from '../../i18n/translator.ts';
import { AppError, type ErrorCode, statusOfCode } from '../errors.ts';

/** RFC 9457 problem details with our code, its sentence in the reader's language, and the fields that were refused. */
export interface Problem {
  type: 'about:blank';
  title: string;
  status: number;
  code: ErrorCode;
  detail: string;
  requestId: string;
  errors?: { pointer: string; code: string; detail: string }[];
  /** The present state, where somebody else was faster. */
  present?: unknown;
}

export function problemOf(error: AppError, t: Translate, requestId: string): Problem {
  return {
    type: 'about:blank',
    title: error.code,
    status: statusOfCode[error.code],
    code: error.code,
    detail: t(`errors:${error.code}`),
    requestId,
    ...(error.fields.length > 0
      ? {
          errors: error.fields.map(({ pointer, code, values }) => ({
            pointer,
            code,
            detail: fieldSentence(t, code, values),
          })),
        }
      : {}),
    ...(error.present === undefined ? {} : { present: error.present }),
  };
}

/** The answer to a program. Pages show the same sentence through `refused.astro`. */
export function problemResponse(error: AppError, t: Translate, requestId: string): Response {
  const headers = new Headers({
    'Content-Type': 'application/problem+json',
    'Cache-Control': 'no-store',
    'X-Request-Id': requestId,
  });
  if (error.retryAfterSeconds !== undefined) headers.set('Retry-After', String(error.retryAfterSeconds));
  return new Response(JSON.stringify(problemOf(error, t, requestId)), { status: error.status, headers });
}

const busyCodes = ['SQLITE_BUSY', 'SQLITE_LOCKED', 'SQLITE_FULL', 'SQLITE_IOERR', 'ENOSPC'];

/** Any thrown thing as a refusal: a full disk or a locked database is `busy`, the rest is our own fault. */
export function toAppError(error: unknown): AppError {
  if (error instanceof AppError) return error;
  const code = String((error as { code?: unknown } | null)?.code ?? '');
  const busy = busyCodes.some((known) => code.startsWith(known));
  return new AppError(busy ? 'busy' : 'unexpected', { cause: error });
}
