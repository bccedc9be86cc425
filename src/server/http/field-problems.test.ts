import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { fieldProblems, pointerTo } from './field-problems.ts';

const schema = z.strictObject({
  name: z.string().min(1).max(5),
  email: z.email(),
  age: z.number().min(18).max(99),
  role: z.enum(['one', 'two']),
  spans: z.array(z.object({ from: z.number() })),
});

function codesOf(input: unknown): Record<string, string> {
  const parsed = schema.safeParse(input, { reportInput: true });
  if (parsed.success) return {};
  return Object.fromEntries(fieldProblems(parsed.error).map(({ pointer, code }) => [pointer, code]));
}

describe('fieldProblems', () => {
  it('names each field that is missing', () => {
    expect(codesOf({})).toEqual({
      '#/name': 'missing',
      '#/email': 'missing',
      '#/age': 'missing',
      '#/role': 'not-a-choice',
      '#/spans': 'missing',
    });
  });

  it('tells apart what is wrong with a value', () => {
    const input = { name: 'too long', email: 'x', age: 3, role: 'three', spans: [{ from: 'six' }], extra: 1 };
    expect(codesOf(input)).toEqual({
      '#/name': 'too-long',
      '#/email': 'not-an-email',
      '#/age': 'too-small',
      '#/role': 'not-a-choice',
      '#/spans/0/from': 'wrong-kind',
      '#/extra': 'unknown-field',
    });
  });

  it('calls an empty text missing and gives the limit of a number', () => {
    expect(codesOf({ name: '', email: 'a@b.example', age: 20, role: 'one', spans: [] })).toEqual({
      '#/name': 'missing',
    });
    const parsed = schema.shape.age.safeParse(100);
    expect(parsed.error && fieldProblems(parsed.error)).toEqual([
      { pointer: '#', code: 'too-big', values: { limit: 99 } },
    ]);
  });

  it('takes the code that a rule of our own names', () => {
    const rule = z.string().refine(() => false, { params: { code: 'not-an-email' } });
    const parsed = rule.safeParse('x');
    expect(parsed.error && fieldProblems(parsed.error)[0]?.code).toBe('not-an-email');
  });
});

describe('pointerTo', () => {
  it('escapes as RFC 6901 says', () => {
    expect(pointerTo(['a/b', 'c~d', 0])).toBe('#/a~1b/c~0d/0');
  });
});
