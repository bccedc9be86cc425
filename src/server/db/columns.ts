import { z } from 'zod';

/** A flag column: SQLite answers 0 or 1, PostgreSQL true or false. */
export const flag = z.union([z.boolean(), z.literal(0), z.literal(1)]).transform((value) => Boolean(value));

/** A moment in milliseconds UTC: PostgreSQL answers big integers as strings. */
export const moment = z.union([z.number(), z.string().regex(/^-?\d+$/)]).transform(Number);

/** A text column that holds `{"v": n, …}`; what stands in it is checked by the given schema. */
export function jsonColumn<Output>(schema: z.ZodType<Output>) {
  return z.string().transform((text, context) => {
    try {
      return schema.parse(JSON.parse(text));
    } catch {
      context.addIssue({ code: 'custom', message: 'stored JSON does not fit its schema' });
      return z.NEVER;
    }
  });
}

/** Text as it is searched: lower case, without accents, single spaces. Kept in a `*_search` column by the code that writes. */
export function foldForSearch(text: string): string {
  return text
    .normalize('NFD')
    .replace(/\p{M}/gu, '')
    .replace(/[łŁ]/g, 'l')
    .replace(/[đĐ]/g, 'd')
    .toLowerCase()
    .replace(/\s+/g, ' ')
    .trim();
}

/** A folded search text as a LIKE pattern; `%`, `_` and `\` in it mean themselves (use with ESCAPE '\'). */
export function likePattern(text: string): string {
  return `%${foldForSearch(text).replace(/[\\%_]/g, (letter) => `\\${letter}`)}%`;
}
