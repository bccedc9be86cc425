import { z } from 'zod';
import '../people/schema-settings.ts';

export const checkSteps = ['sent', 'delivered', 'answered', 'signature'] as const;
export type CheckStep = (typeof checkSteps)[number];

/** Why a step is not there yet, or never will be. */
export const checkReasons = [
  'hours',
  'worker',
  'refused',
  'undelivered',
  'noReport',
  'answerNow',
  'noAnswer',
  'proof',
] as const;
export type CheckReason = (typeof checkReasons)[number];

const findingSchema = z.object({
  state: z.enum(['waiting', 'good', 'bad']),
  why: z.enum(checkReasons).nullable(),
});
export type CheckFinding = z.output<typeof findingSchema>;

/** GET and POST /api/shop/texts-check. */
export const textsCheckSchema = z.object({
  sender: z.string().nullable(),
  webhook: z.string(),
  /** The admin who checks. */
  personId: z.string(),
  /** Their own number; null without one. */
  phone: z.string().nullable(),
  consent: z.enum(['unasked', 'asked', 'agreed', 'opted out']),
  /** When the last check went out; null before the first. */
  startedAt: z.number().nullable(),
  code: z.string().nullable(),
  steps: z.object({
    sent: findingSchema,
    delivered: findingSchema,
    answered: findingSchema,
    signature: findingSchema,
  }),
  isDone: z.boolean(),
});
export type TextsCheck = z.output<typeof textsCheckSchema>;
