import { z } from './zod.ts';

/** What a fact speaks about, by position or letter, never by name: settings, terms, results (0 is the main one), runs (in run order). */
export const factRefsSchema = z.strictObject({
  factors: z.array(z.string()).exactOptional(),
  terms: z.array(z.string()).exactOptional(),
  results: z.array(z.number()).exactOptional(),
  runs: z.array(z.number()).exactOptional(),
});

export type FactRefs = z.infer<typeof factRefsSchema>;

/** One kind of fact: a name, its figures and codes, and what it speaks about. Facts carry no words, so that every language can word them. */
export function defineFact<Kind extends string, Values extends z.ZodRawShape>(kind: Kind, values: Values) {
  return z.strictObject({ kind: z.literal(kind), values: z.strictObject(values), refs: factRefsSchema });
}
