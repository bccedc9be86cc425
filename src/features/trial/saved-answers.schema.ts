import { z } from 'zod';
import { type AnswerOf, type QuestionName, questionNames, questionSchemas } from './answers.schema.ts';
import { publicPlanSchema } from './plan.schema.ts';
import { publicReviewSchema } from './review.schema.ts';
import { publicTrialSchema } from './trial.schema.ts';

/** One question as it is stored: what was typed, how often it was saved, and who saved it last. */
const saved = { version: z.number().int(), savedAt: z.number(), savedBy: z.string() };

export const savedQuestionsSchema = z
  .object(
    Object.fromEntries(
      questionNames.map((name) => [name, z.object({ ...saved, content: questionSchemas[name] })]),
    ) as unknown as {
      [Name in QuestionName]: z.ZodObject<typeof saved & { content: (typeof questionSchemas)[Name] }>;
    },
  )
  .partial();
export type SavedQuestions = z.output<typeof savedQuestionsSchema>;

/**
 * Whether a second person must agree before the start: `alone`: one is needed, but this reader is the only one here who
 * could, so the trial may start and says that nobody else checked it; `missing`: the shop has nobody who could.
 */
export const secondPersonStates = ['not needed', 'needed', 'alone', 'missing'] as const;
export type SecondPerson = (typeof secondPersonStates)[number];

/** GET /api/trials/:id/answers: all that the wizard and the engineer's page need of a trial. */
export const publicAnswersSchema = z.object({
  trialId: z.string(),
  ...publicTrialSchema.pick({
    number: true,
    title: true,
    machine: true,
    state: true,
    phase: true,
    revision: true,
  }).shape,
  /** Whether this reader may change answers now. */
  mayWrite: z.boolean(),
  questions: savedQuestionsSchema,
  plan: publicPlanSchema.nullable(),
  review: publicReviewSchema.nullable(),
  /** Whether it goes to a second person before it starts. */
  reviewDue: z.boolean(),
  secondPerson: z.enum(secondPersonStates),
});
export type PublicAnswers = z.output<typeof publicAnswersSchema>;

/**
 * PATCH /api/trials/:id/answers: one question. `base` is the version that the reader built on, 0 where there was none;
 * `save` an id of this save, so that sending it again is harmless.
 */
export const saveAnswerSchema = z
  .strictObject({
    question: z.enum(questionNames),
    base: z.number().int().min(0),
    content: z.unknown(),
    save: z.uuid(),
  })
  .transform(({ question, content, ...rest }, context) => {
    const parsed = questionSchemas[question].safeParse(content, { reportInput: true });
    if (parsed.success) return { ...rest, question, content: parsed.data };
    for (const issue of parsed.error.issues) {
      context.issues.push({
        ...issue,
        path: ['content', ...issue.path],
        input: issue.input,
      } as z.core.$ZodRawIssue);
    }
    return z.NEVER;
  });
export type SaveAnswer = z.output<typeof saveAnswerSchema>;

/** What an island sends. */
export interface SaveAnswerBody<Name extends QuestionName = QuestionName> {
  question: Name;
  base: number;
  content: AnswerOf<Name>;
  save: string;
}

/** The answer to a save: the version that now stands. */
export const answerSavedSchema = z.object({
  question: z.enum(questionNames),
  version: z.number().int(),
  savedAt: z.number(),
  savedBy: z.string(),
  /** Of the trial, which may have gone back to draft by the change. */
  state: publicTrialSchema.shape.state,
  revision: z.number(),
});
export type AnswerSaved = z.output<typeof answerSavedSchema>;

/** What stands under a question that somebody else changed: `present` of the refusal `changed-meanwhile`. */
export const presentAnswerSchema = z.object({ ...saved, content: z.unknown() });
export type PresentAnswer = z.output<typeof presentAnswerSchema>;
