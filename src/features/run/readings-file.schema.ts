import { z } from 'zod';
import '../people/schema-settings.ts';

/** What may be wrong with one cell or row of a file of readings. */
export const readingFaultCodes = [
  'quotes',
  'no-run',
  'closed-run',
  'same-run',
  'no-figure',
  'not-a-number',
  'not-whole',
  'off-scale',
] as const;
export type ReadingFaultCode = (typeof readingFaultCodes)[number];

export const readingFileFaults = ['empty', 'no-headings', 'too-many-rows', 'not-utf8'] as const;
export type ReadingFileFault = (typeof readingFileFaults)[number];

/** POST /api/trials/:id/readings/import: `preview=1` looks only; without it, `digest` names the file that was looked at. */
export const readingsImportQuerySchema = z.strictObject({
  preview: z.literal('1').optional(),
  digest: z
    .string()
    .regex(/^[0-9a-f]{64}$/)
    .optional(),
});

export const readingsPreviewSchema = z.object({
  digest: z.string(),
  /** Rows with words, the headings left out. */
  rows: z.number(),
  fileFault: z.enum(readingFileFaults).nullable(),
  /** The first faults by line; none is imported while there is one. */
  faultCount: z.number(),
  faults: z.array(z.object({ line: z.number(), code: z.enum(readingFaultCodes), text: z.string() })),
  /** The first few runs as they would be kept. */
  sample: z.array(z.object({ run: z.number(), figures: z.array(z.number()) })),
  /** How many runs were kept: none in a preview, and none while anything is wrong. */
  kept: z.number(),
});
export type ReadingsPreview = z.output<typeof readingsPreviewSchema>;
