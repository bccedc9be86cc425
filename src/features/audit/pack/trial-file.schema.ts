import { z } from 'zod';
import '../../people/schema-settings.ts';
import { briefSchema, proposalSchema } from '../../../lib/doe/index.ts';
import { answersDocumentSchema } from '../../trial/answers.schema.ts';
import { reviewStates, reviewSubjects } from '../../trial/review.schema.ts';
import { trialStates } from '../../trial/trial-states.ts';
import { decisionOutcomes } from '../../verdict/decision.ts';
import { verdictFactsSchema } from '../../verdict/stored-verdict.ts';
import { kept } from './kept.ts';
import { momentInFile, mostRuns, runInFile, stretchInFile } from './trial-file-runs.schema.ts';

const n = z.number().int().min(1).max(100_000);
const hash = z.string().max(200);
const words = z.string().max(2_000);
const most = 200;

const planInFile = z.strictObject({
  n,
  phase: z.enum(['main', 'check']),
  seed: z.number().int().min(0).max(Number.MAX_SAFE_INTEGER),
  coreVersion: z.string().max(40),
  /** The answers as the statistics read them: results, settings A, B, …, rules and limits. */
  brief: briefSchema,
  settingIds: z.array(z.string().max(40)).max(7),
  /** Generators, defining words, aliases, error plan, power and layout. */
  proposal: proposalSchema,
  hash,
  at: momentInFile,
});

/** Results with what went into their analysis and what came out: stored evidence, kept as it is. */
const analysisInFile = z.looseObject({
  v: z.literal(1),
  results: z
    .array(z.looseObject({ spec: z.unknown(), input: z.unknown(), analysis: z.unknown() }))
    .min(1)
    .max(4),
});

const verdictInFile = z.strictObject({
  n,
  /** SHA-256 of plan and readings: equal readings have an equal hash. */
  inputHash: hash,
  coreVersion: z.string().max(40),
  /** What the verdict says, as stored when it was made. */
  facts: kept(verdictFactsSchema),
  /** For each result its runs, effects, tests and analysis of variance. */
  analysis: kept(analysisInFile),
  at: momentInFile,
});

const decisionInFile = z.strictObject({
  n,
  /** The verdict (its n) that it followed. */
  verdict: n,
  outcome: z.enum(decisionOutcomes),
  settings: z.array(z.union([z.number(), z.string().max(200)])).max(7),
  note: words,
  at: momentInFile,
});

const reviewInFile = z.strictObject({
  subject: z.enum(reviewSubjects),
  /** An approval holds for exactly what has this hash. */
  subjectHash: hash,
  round: n,
  state: z.enum(reviewStates),
  askedAt: momentInFile,
  decidedAt: momentInFile.nullable(),
  comments: z
    .array(
      z.strictObject({
        place: z.string().max(400),
        words,
        at: momentInFile,
        settledAt: momentInFile.nullable(),
      }),
    )
    .max(1_000),
});

/**
 * A whole trial as one file. It names no person and holds no id of a shop: runs go by their number, plans, stretches,
 * verdicts and decisions by their n. A field that is added raises no version; one that changes its meaning does.
 */
export const trialFileSchema = z.strictObject({
  format: z.literal('trywell-trial', { error: 'not-a-trial-file' }),
  version: z.literal(1, { error: 'unknown-version' }),
  trial: z.strictObject({
    /** In the shop it comes from. */
    number: n,
    title: z.string().max(400),
    machine: z.string().max(400),
    phase: z.enum(['main', 'check']),
    state: z.enum(trialStates),
    createdAt: momentInFile,
    updatedAt: momentInFile,
  }),
  answers: z.strictObject({
    /** Hash of the answers when the trial was started, people included. */
    frozenHash: hash.nullable(),
    /** What was typed, question by question, without people. */
    document: answersDocumentSchema,
  }),
  plans: z.array(planInFile).max(most),
  stretches: z.array(stretchInFile).max(most),
  runs: z.array(runInFile).max(mostRuns),
  verdicts: z.array(verdictInFile).max(most),
  decisions: z.array(decisionInFile).max(most),
  reviews: z.array(reviewInFile).max(most),
});
export type TrialFile = z.output<typeof trialFileSchema>;
/** As it stands in the file: a resolution without end is null there. */
export type WrittenTrialFile = z.input<typeof trialFileSchema>;
