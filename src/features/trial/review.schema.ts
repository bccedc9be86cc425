import { z } from 'zod';
import '../people/schema-settings.ts';

export const reviewSubjects = ['plan', 'verdict', 'adoption'] as const;
export const reviewStates = [
  'asked',
  'approved',
  'sent back',
  'taken back',
  'reopened',
  'unchecked',
] as const;

export const publicCommentSchema = z.object({
  id: z.string(),
  /** A JSON pointer into what is reviewed, e.g. `#/settings/settings/0/high`. */
  place: z.string(),
  words: z.string(),
  /** The name. */
  by: z.string(),
  at: z.number(),
  settledAt: z.number().nullable(),
});
export type PublicComment = z.output<typeof publicCommentSchema>;

export const publicReviewSchema = z.object({
  id: z.string(),
  subject: z.enum(reviewSubjects),
  /** Counts the times it was asked for. */
  round: z.number(),
  /** `unchecked`: nobody else could look, so it was started without a second person. */
  state: z.enum(reviewStates),
  askedBy: z.string(),
  askedAt: z.number(),
  decidedBy: z.string().nullable(),
  decidedAt: z.number().nullable(),
  /** Whether an approval holds for what stands now. */
  holds: z.boolean(),
  /** Whether this reader may approve it or send it back. */
  mayDecide: z.boolean(),
  /** Of this round and of those before it, oldest first. */
  comments: z.array(publicCommentSchema),
});
export type PublicReview = z.output<typeof publicReviewSchema>;

export const reviewParamsSchema = z.object({ id: z.string() });

/** POST /api/reviews/:id/{approve,send-back,take-back}: the round that the reader saw. */
export const decideReviewSchema = z.strictObject({ round: z.number().int().positive() });

/** POST /api/reviews/:id/comments. The id may be the client's own. */
export const addCommentSchema = z.strictObject({
  id: z.uuidv7(),
  place: z
    .string()
    .regex(/^#(\/[^/]*)*$/)
    .max(200),
  words: z.string().trim().min(1).max(1_000),
});
export type AddComment = z.output<typeof addCommentSchema>;

/** PATCH /api/reviews/:id/comments: settles one, or opens it again. */
export const settleCommentSchema = z.strictObject({ id: z.uuidv7(), settled: z.boolean() });
export type SettleComment = z.output<typeof settleCommentSchema>;
