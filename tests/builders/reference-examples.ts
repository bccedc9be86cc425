import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';
import type { AnalysisInput } from '../../src/lib/doe/analysis/analysis.ts';

// Published examples, each file names its source; every number was computed with R 4.2.2 and again with numpy, which agree to 2e-11.
const folder = join(import.meta.dirname, '../fixtures/reference/open');

const numberOrNull = z.number().nullable();
const rowSchema = z.object({
  fitted: z.number(),
  residual: z.number(),
  leverage: z.number(),
  internallyStudentised: numberOrNull,
  externallyStudentised: numberOrNull,
  cooks: numberOrNull,
});
const tableRowSchema = z.looseObject({
  coefficient: z.number(),
  ss: z.number(),
  se: numberOrNull.optional(),
  t: numberOrNull.optional(),
  p: numberOrNull.optional(),
  ci95: z.array(z.number()).nullable().optional(),
});
const anovaRowSchema = z.looseObject({
  df: z.number(),
  ss: z.number(),
  F: z.number().optional(),
  p: z.number().optional(),
});
const modelSchema = z.looseObject({
  terms: z.array(z.string()),
  hasCurvatureTerm: z.boolean(),
  blocksInModel: z.boolean(),
  dfResidual: z.number(),
  intercept: z.looseObject({ coefficient: z.number(), se: numberOrNull.optional() }),
  table: z.record(z.string(), tableRowSchema),
  anova: z.record(z.string(), anovaRowSchema),
  s: numberOrNull.optional(),
  r2: z.number(),
  adjR2: numberOrNull.optional(),
  press: numberOrNull.optional(),
  predR2: numberOrNull.optional(),
  rows: z.array(rowSchema),
  predictions: z
    .array(
      z.object({
        coded: z.record(z.string(), z.number()),
        fit: z.number(),
        seFit: numberOrNull,
        sePred: numberOrNull,
        ci95: z.array(z.number()).nullable(),
        pi95: z.array(z.number()).nullable(),
      }),
    )
    .optional(),
});
const exampleSchema = z.looseObject({
  id: z.string(),
  title: z.string(),
  source: z.string(),
  kind: z.string().optional(),
  factors: z.array(z.looseObject({ letter: z.string(), kind: z.string() })).optional(),
  runs: z.array(
    z.looseObject({
      coded: z.record(z.string(), z.number()).optional(),
      block: z.number().optional(),
      centre: z.boolean().optional(),
      n: z.number().optional(),
      y: z.number(),
    }),
  ),
  published: z.array(
    z.object({
      quantity: z.string(),
      printed: z.string(),
      value: z.number(),
      computed: z.number(),
      agrees: z.boolean(),
      note: z.string().optional(),
    }),
  ),
  computed: z.looseObject({
    design: z
      .looseObject({
        aliases: z.record(z.string(), z.array(z.string())),
        confoundedWithBlocks: z.array(z.string()).optional(),
      })
      .optional(),
    effects: z.record(z.string(), z.number()).optional(),
    ss: z.record(z.string(), z.number()).optional(),
    mean: z.number().optional(),
    lenth: z
      .looseObject({ s0: z.number(), PSE: z.number(), d: z.number(), ME: z.number(), SME: z.number() })
      .optional(),
    curvature: z
      .looseObject({ difference: z.number(), ss: z.number(), t: numberOrNull, p: numberOrNull })
      .optional(),
    models: z.record(z.string(), modelSchema).optional(),
  }),
});
export type Example = z.infer<typeof exampleSchema>;

export const referenceExamples = readdirSync(folder)
  .filter((name) => name.endsWith('.json'))
  .map((name) => exampleSchema.parse(JSON.parse(readFileSync(join(folder, name), 'utf8'))));
/** Those that are factorial experiments with measured results. */
export const factorialExamples = referenceExamples.filter((example) => example.kind === undefined);

/** An example as the core takes it; error from the residual, as the programs that computed the figures do. */
export function toAnalysisInput(
  example: Example,
  more: Partial<AnalysisInput> & { logarithm?: boolean; blocks?: boolean },
): AnalysisInput {
  const { logarithm, blocks, ...rest } = more;
  const factors = (example.factors ?? []).map((factor) => ({
    letter: factor.letter,
    kind: factor.kind === 'categorical' ? ('choice' as const) : ('number' as const),
  }));
  return {
    factors,
    runs: example.runs.map((run) => ({
      x: factors.map(({ letter }) => run.coded?.[letter] ?? Number.NaN),
      y: run.y,
      center: run.centre ?? false,
      ...(blocks && run.block !== undefined && { block: run.block }),
    })),
    error: 'residual',
    ...(logarithm && { scale: 'log' }),
    ...rest,
  };
}
