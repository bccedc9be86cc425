import { z } from 'zod';
import { type AdviceFact, adviceFacts } from '../../src/lib/doe/advice/advice-facts.ts';

/** Figures that words must cope with. */
export const sampleFigures = { plain: 6.2, negative: -6.2, tiny: 1e-6, huge: 1e9, zero: 0 } as const;
/** Counts for which some language has a plural form of its own. */
export const sampleCounts = [1, 3, 5, 22] as const;

const counted = new Set([
  'runs',
  'missing',
  'planned',
  'contrasts',
  'parts',
  'each',
  'readings',
  'furtherPairs',
  'lotNeeded',
]);
const chances = new Set(['share', 'probability', 'power', 'chance']);

interface Sample {
  figure: number;
  count: number;
  /** Whether an interval is there, and whether it holds zero. */
  interval: 'none' | 'apart' | 'around';
}

/** Every value that a field of a fact may have, for one sample. */
function valuesOf(name: string, schema: z.core.$ZodType, sample: Sample): unknown[] {
  const { figure, count, interval } = sample;
  if (counted.has(name)) return [count];
  if (chances.has(name)) return [Math.min(1, count / 10)];
  if (schema instanceof z.ZodEnum) return [...schema.options];
  if (schema instanceof z.ZodBoolean) return [true, false];
  if (schema instanceof z.ZodLiteral) return [...schema.values];
  if (schema instanceof z.ZodUnion) return schema.options.flatMap((option) => valuesOf(name, option, sample));
  if (schema instanceof z.ZodArray) return valuesOf('', schema.element, sample).map((value) => [value]);
  if (schema instanceof z.ZodNumber)
    return [name === 'settings' ? 2 : name === 'ratio' ? Math.abs(figure) || 1 : figure];
  const room = Math.abs(figure) * (interval === 'around' ? 2 : 0.25) || 1;
  if (schema instanceof z.ZodTuple) return [[figure - room, figure + room]];
  if (schema instanceof z.ZodNullable)
    return interval === 'none' ? [null] : valuesOf(name, schema.unwrap(), sample);
  throw new RangeError(`valuesOf: no samples for ${name}`);
}

/** Facts of every kind with every code and the given figures, speaking of the settings A to C and of runs 0 and 1. */
export function everyAdviceFact(sample: Sample): AdviceFact[] {
  return adviceFacts.flatMap((schema) => {
    let all: Record<string, unknown>[] = [{}];
    for (const [name, field] of Object.entries(schema.shape.values.shape))
      all = all.flatMap((values) =>
        valuesOf(name, field as z.core.$ZodType, sample).map((value) => ({ ...values, [name]: value })),
      );
    const needsPartner = ['depends-on-partner', 'pair-corners'].includes(schema.shape.kind.value);
    const refs = [
      { terms: ['A'], factors: needsPartner ? ['A', 'C'] : ['A'], results: [0], runs: [0] },
      { terms: ['B', 'AC'], factors: ['B', 'A'], results: [0], runs: [0, 1] },
      { terms: ['AB', 'C'], factors: ['A', 'B'], results: [1], runs: [0] },
    ];
    return all.flatMap((values) =>
      refs.map((each) => schema.parse({ kind: schema.shape.kind.value, values, refs: each })),
    );
  });
}
