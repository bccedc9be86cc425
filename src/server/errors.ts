import type { FieldProblem } from '../i18n/field-codes.ts';

/**
 * Every refusal the product can give, with its HTTP status. The code travels; its sentence stands in
 * `locales/<language>/errors.json` under the same name.
 */
export const statusOfCode = {
  malformed: 400,
  'not-signed-in': 401,
  forbidden: 403,
  'foreign-origin': 403,
  'bad-signature': 403,
  'own-review': 403,
  'not-found': 404,
  'method-not-allowed': 405,
  'already-there': 409,
  'changed-meanwhile': 409,
  'not-now': 409,
  'no-reviewer': 409,
  'last-admin': 409,
  'open-runs': 409,
  'file-changed': 409,
  gone: 410,
  'length-required': 411,
  'too-large': 413,
  'wrong-content-type': 415,
  invalid: 422,
  'too-many': 429,
  unexpected: 500,
  busy: 503,
} as const satisfies Record<string, number>;

export type ErrorCode = keyof typeof statusOfCode;

/** An expected refusal. `detail` is for the log only and never reaches a reader. */
export class AppError extends Error {
  readonly code: ErrorCode;
  readonly fields: FieldProblem[];
  readonly retryAfterSeconds: number | undefined;
  readonly present: unknown;

  constructor(
    code: ErrorCode,
    about: {
      detail?: string;
      fields?: FieldProblem[];
      retryAfterSeconds?: number;
      present?: unknown;
      cause?: unknown;
    } = {},
  ) {
    super(about.detail ?? code, about.cause === undefined ? {} : { cause: about.cause });
    this.name = 'AppError';
    this.code = code;
    this.fields = about.fields ?? [];
    this.retryAfterSeconds = about.retryAfterSeconds;
    this.present = about.present;
  }

  get status(): number {
    return statusOfCode[this.code];
  }
}
