/** What can be wrong with one answer. The sentence of each stands in `errors:field` under the same name. */
export const fieldCodes = [
  'missing',
  'wrong-kind',
  'too-small',
  'too-big',
  'too-short',
  'too-long',
  'not-a-choice',
  'not-an-email',
  'not-a-phone',
  'not-a-time-zone',
  'taken',
  'mail-needed',
  'line-phone-needs-number',
  'line-phone-only-operator',
  'pair-needed',
  'statement-needed',
  'too-common',
  'too-plain',
  'too-close',
  'wrong-password',
  'not-a-number',
  'not-whole',
  'not-above-zero',
  'low-not-below-high',
  'same-name',
  'usual-outside',
  'beyond-machine',
  'step-too-coarse',
  'too-many-hard',
  'off-scale',
  'too-few-numbers',
  'limit-or-none',
  'some-or-none',
  'mix-of-two',
  'setting-gone',
  'two-or-four',
  'one-split',
  'not-a-time',
  'not-a-date',
  'tick-all',
  'version-missing',
  'person-gone',
  'decide-mix',
  'choose-plan',
  'check-first',
  'no-plan-fits',
  'unknown-field',
  'does-not-fit',
  'not-a-trial-file',
  'unknown-version',
  'twice',
  'points-nowhere',
  'one-each',
  'does-not-follow',
] as const;
export type FieldCode = (typeof fieldCodes)[number];

export function isFieldCode(code: string): code is FieldCode {
  return fieldCodes.some((known) => known === code);
}

/** One field that was refused: where it stands (JSON pointer) and the code of what is wrong. */
export interface FieldProblem {
  pointer: string;
  code: string;
  values?: Record<string, string | number>;
}

/** The part of a translator that a field's sentence needs: the server's and an island's both have it. */
type TranslateField = (
  key: `errors:field.${FieldCode}`,
  values: Record<string, string | number> & { limit: string | number },
) => string;

/** The sentence of a field problem; an unknown code is a programmer's slip and reads as "does not fit". */
export function fieldSentence(
  t: TranslateField,
  code: string,
  values: Record<string, string | number> = {},
): string {
  return t(`errors:field.${isFieldCode(code) ? code : 'does-not-fit'}`, { limit: '', ...values });
}
