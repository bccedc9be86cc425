import { z } from 'zod';
import { jsonColumn, moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { reviewStates, reviewSubjects } from '../trial/review.schema.ts';
import { decisionOutcomes } from '../verdict/decision.ts';

const storedJson = z.string().transform((text): unknown => JSON.parse(text));

const planRow = z
  .object({
    id: z.string(),
    n: z.number(),
    phase: z.enum(['main', 'check']),
    seed: moment,
    core_version: z.string(),
    brief: jsonColumn(z.object({ brief: z.unknown(), settingIds: z.array(z.string()) })),
    proposal: jsonColumn(z.object({ proposal: z.unknown() })),
    hash: z.string(),
    created_at: moment,
  })
  .transform(({ core_version, brief, proposal, created_at, ...row }) => ({
    ...row,
    coreVersion: core_version,
    ...brief,
    ...proposal,
    at: created_at,
  }));

const verdictRow = z
  .object({
    id: z.string(),
    n: z.number(),
    input_hash: z.string(),
    core_version: z.string(),
    facts: storedJson,
    analysis: storedJson,
    created_at: moment,
  })
  .transform(({ input_hash, core_version, created_at, ...row }) => ({
    ...row,
    inputHash: input_hash,
    coreVersion: core_version,
    at: created_at,
  }));

const decisionRow = z
  .object({
    n: z.number(),
    verdict_id: z.string(),
    outcome: z.enum(decisionOutcomes),
    settings: jsonColumn(z.object({ values: z.array(z.union([z.number(), z.string()])) })),
    note: z.string(),
    decided_at: moment,
  })
  .transform(({ verdict_id, settings, decided_at, ...row }) => ({
    ...row,
    verdictId: verdict_id,
    settings: settings.values,
    at: decided_at,
  }));

const reviewRow = z.object({
  id: z.string(),
  subject: z.enum(reviewSubjects),
  subject_hash: z.string(),
  round: z.number(),
  state: z.enum(reviewStates),
  asked_at: moment,
  decided_at: moment.nullable(),
});

/** Every plan that was ever chosen, the first one first; brief and proposal as they are stored. */
export async function listStoredPlans(scope: ShopScope, trialId: string) {
  const own = { shop_id: scope.shopId, trial_id: trialId };
  return z.array(planRow).parse(await scope.db('plans').where(own).orderBy('n'));
}

/** Every verdict with all that is stored of it, the first one first. */
export async function listStoredVerdicts(scope: ShopScope, trialId: string) {
  const own = { shop_id: scope.shopId, trial_id: trialId };
  return z.array(verdictRow).parse(await scope.db('verdicts').where(own).orderBy('n'));
}

export async function listStoredDecisions(scope: ShopScope, trialId: string) {
  const own = { shop_id: scope.shopId, trial_id: trialId };
  return z.array(decisionRow).parse(await scope.db('decisions').where(own).orderBy('n'));
}

/** All rounds of all subjects, in the order in which they were asked for. */
export async function listStoredReviews(scope: ShopScope, trialId: string) {
  const own = { shop_id: scope.shopId, trial_id: trialId };
  return z.array(reviewRow).parse(await scope.db('reviews').where(own).orderBy('id'));
}
