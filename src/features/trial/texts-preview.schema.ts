import { z } from 'zod';
import { languages } from '../../i18n/languages.ts';

/** GET /api/trials/:id/texts: run 1 as each language of the crew would get it. */
export const textsPreviewSchema = z.object({
  texts: z.array(
    z.object({
      language: z.enum(languages),
      body: z.string(),
      /** Letters of the seven-bit alphabet; of the longer one where `sevenBit` is false. */
      units: z.number(),
      sevenBit: z.boolean(),
      /** What the text service charges for. */
      segments: z.number(),
      /** The name to shorten by so many letters; null where the text fits. */
      tooLong: z.object({ name: z.string(), letters: z.number() }).nullable(),
    }),
  ),
  /** Null while an answer or the plan is missing. */
  whole: z.object({ texts: z.number(), segments: z.number() }).nullable(),
});
export type TextsPreview = z.output<typeof textsPreviewSchema>;

/** POST /api/trials/:id/practice: what became of the wish to see run 1 on one's own phone. */
export const practiceSchema = z.object({
  outcome: z.enum(['queued', 'already', 'no phone', 'no consent', 'no plan']),
});
export type Practice = z.output<typeof practiceSchema>;
