import { z } from 'zod';
import { importFaultCodes } from './import-faults.ts';
import './schema-settings.ts';

/** The most that one file may hold. `server/limits.ts` refuses the bytes, the service the rows. */
export const importLimits = { rows: 5_000, bytes: 2 * 1024 * 1024 } as const;

/** Why a file as a whole is not read. */
export const fileFaultCodes = ['empty', 'no-headings', 'too-many-rows', 'not-utf8'] as const;

/** POST /api/people/import: `preview=1` looks only; without it, `digest` names the file that was looked at. */
export const importQuerySchema = z.strictObject({
  preview: z.literal('1').optional(),
  digest: z
    .string()
    .regex(/^[0-9a-f]{64}$/)
    .optional(),
});

export const importFaultSchema = z.object({
  line: z.number(),
  code: z.enum(importFaultCodes),
  text: z.string(),
  otherLine: z.number().optional(),
});

export const importPreviewSchema = z.object({
  digest: z.string(),
  /** Rows with words, the headings left out. */
  rows: z.number(),
  fileFault: z.enum(fileFaultCodes).nullable(),
  /** How many faults there are; `faults` lists the first of them by line. */
  faultCount: z.number(),
  faults: z.array(importFaultSchema),
  /** The first few people as they would be added. */
  sample: z.array(z.object({ line: z.number(), name: z.string(), phone: z.string().nullable() })),
  /** How many people were added: none in a preview, and none while anything is wrong. */
  added: z.number(),
});
export type ImportPreview = z.output<typeof importPreviewSchema>;
