import type { z } from 'zod';
import { type FieldCode, type FieldProblem, isFieldCode } from './field-codes.ts';

type Issue = z.core.$ZodIssue;

function limitOf(value: number | bigint): { limit: number } {
  return { limit: Number(value) };
}

function describeIssue(issue: Issue): { code: FieldCode; values?: { limit: number } } {
  switch (issue.code) {
    case 'invalid_type':
      return { code: issue.input === undefined ? 'missing' : 'wrong-kind' };
    case 'too_small': {
      const isEmpty = Number(issue.minimum) === 1;
      if (issue.origin === 'array' && isEmpty) return { code: 'missing' };
      if (issue.origin !== 'string') return { code: 'too-small', values: limitOf(issue.minimum) };
      return isEmpty ? { code: 'missing' } : { code: 'too-short', values: limitOf(issue.minimum) };
    }
    case 'too_big':
      return { code: issue.origin === 'string' ? 'too-long' : 'too-big', values: limitOf(issue.maximum) };
    case 'invalid_format':
      return { code: issue.format === 'email' ? 'not-an-email' : 'does-not-fit' };
    case 'invalid_value':
      return { code: isFieldCode(issue.message) ? issue.message : 'not-a-choice' };
    case 'invalid_union':
      return { code: 'not-a-choice' };
    case 'unrecognized_keys':
      return { code: 'unknown-field' };
    case 'custom': {
      const named = String(issue.params?.['code'] ?? issue.message);
      return { code: isFieldCode(named) ? named : 'does-not-fit' };
    }
    default:
      return { code: 'does-not-fit' };
  }
}

/** A path as JSON pointer in a fragment (RFC 6901), e.g. `#/workHours/0/from`. */
export function pointerTo(path: readonly PropertyKey[]): string {
  return `#${path.map((part) => `/${String(part).replace(/~/g, '~0').replace(/\//g, '~1')}`).join('')}`;
}

/**
 * What zod found, as fields with codes: the words for them stand in `locales`. A rule of our own names its code as its
 * message or in `params`. Forms in the browser and endpoints read a refusal through this alike.
 */
export function fieldProblems(error: z.ZodError): FieldProblem[] {
  return error.issues.flatMap((issue) => {
    const { code, values } = describeIssue(issue);
    const paths =
      issue.code === 'unrecognized_keys' ? issue.keys.map((key) => [...issue.path, key]) : [issue.path];
    return paths.map((path) => ({ pointer: pointerTo(path), code, ...(values ? { values } : {}) }));
  });
}
