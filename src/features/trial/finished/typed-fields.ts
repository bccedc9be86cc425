import { z } from 'zod';
import type { FieldCode } from '../../../i18n/field-codes.ts';
import '../../people/schema-settings.ts';
import { parseFigure } from './typed-figure.ts';

/** What a figure must be, besides one. */
export interface FigureRule {
  atLeast?: number;
  atMost?: number;
  above?: 0;
  whole?: boolean;
}

const controlCharacters = /\p{Cc}|[\u2028\u2029\u202a-\u202e\u2066-\u2069]/u;

function refuse(context: z.RefinementCtx, code: FieldCode, input: unknown): never {
  context.addIssue({ code: 'custom', message: code, input });
  return z.NEVER;
}

function checkFigure(figure: number, rule: FigureRule, context: z.RefinementCtx): number {
  const { atLeast, atMost } = rule;
  const bound = { origin: 'number', inclusive: true, input: figure } as const;
  if (rule.whole && !Number.isInteger(figure)) return refuse(context, 'not-whole', figure);
  if (rule.above !== undefined && figure <= rule.above) return refuse(context, 'not-above-zero', figure);
  if (atLeast !== undefined && figure < atLeast) {
    context.addIssue({ code: 'too_small', minimum: atLeast, ...bound });
    return z.NEVER;
  }
  if (atMost !== undefined && figure > atMost) {
    context.addIssue({ code: 'too_big', maximum: atMost, ...bound });
    return z.NEVER;
  }
  return figure;
}

/** A figure that may be left out: null then, for "not sure" and for the default alike. */
export function figure(rule: FigureRule = {}) {
  return z
    .string()
    .optional()
    .transform((typed = '', context): number | null => {
      if (typed.trim() === '') return null;
      const value = parseFigure(typed);
      if (value === null) return refuse(context, 'not-a-number', typed);
      return checkFigure(value, rule, context);
    });
}

/** A figure that nobody else can know. */
export function neededFigure(rule: FigureRule = {}) {
  return figure(rule).transform((value, context): number =>
    value === null ? refuse(context, 'missing', value) : value,
  );
}

/** Words on one line that may be left out: an empty text then. */
export const line = z
  .string()
  .optional()
  .transform((typed = '', context): string => {
    const text = typed.trim();
    return controlCharacters.test(text) ? refuse(context, 'does-not-fit', typed) : text;
  });

export const neededLine = line.transform((text, context): string =>
  text === '' ? refuse(context, 'missing', text) : text,
);

/** Words that may run over several lines. */
export const words = z
  .string()
  .optional()
  .transform((typed = ''): string => typed.trim());

/** Names the fault of one field of a question from a rule over several of its fields. */
export function point(context: z.RefinementCtx, path: PropertyKey[], code: FieldCode): void {
  context.addIssue({ code: 'custom', path, message: code, input: null });
}

/** As names are compared: `Jaw temp` and `jaw  temp` are one. */
export function foldName(name: string): string {
  return name.normalize('NFC').trim().replace(/\s+/g, ' ').toLowerCase();
}
