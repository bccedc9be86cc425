import { randomInt } from 'node:crypto';
import {
  type Brief,
  coreVersion,
  hardestRuns,
  layOutRuns,
  PlanError,
  type PlannedRun,
  type Proposal,
  proposePlans,
} from '../../lib/doe/index.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { newId } from '../../server/ids.ts';
import { readStoredAnswers } from './answers.repository.ts';
import type { Answers } from './answers.schema.ts';
import { findLatestPlan, insertPlan, type StoredPlan } from './plan.repository.ts';
import type { HardMix, PublicPlan } from './plan.schema.ts';
import { toFields } from './readiness.ts';
import { hashOf } from './reviewed-hash.service.ts';
import { toBrief } from './to-brief.ts';
import type { ChoosePlan } from './trial.schema.ts';
import {
  changedMeanwhile,
  findStep,
  findTrialOf,
  type TrialReader,
  takeStep,
} from './trial-reader.service.ts';

/** Seeds are drawn here and stored: the same seed always lays out the same runs. */
const seedRange = 2 ** 31;

/** The runs of a stored plan, in the order of running. */
export function layOutPlan(plan: StoredPlan): PlannedRun[] {
  return layOutRuns(plan.brief, plan.proposal, plan.seed);
}

/** Whether the plan was made for exactly these answers. */
export function planFits(plan: StoredPlan, answers: Answers): boolean {
  const read = toBrief(answers);
  if ('problems' in read) return false;
  return (
    hashOf({ brief: read.brief, ids: read.settingOfLetter }) ===
    hashOf({ brief: plan.brief, ids: plan.settingIds })
  );
}

/** The mixes of a plan that are hardest on people and machine, each by its first run. */
export function hardestMixes(plan: StoredPlan, runs: readonly PlannedRun[] = layOutPlan(plan)): HardMix[] {
  return hardestRuns(plan.brief, runs).map(({ order }) => {
    const coded = runs.find((run) => run.order === order)?.coded ?? [];
    const ends = plan.settingIds.flatMap((id, place) => {
      const level = coded[place] ?? 0;
      return level === 0 ? [] : [[id, level > 0 ? 'high' : 'low'] as const];
    });
    return { order, ends: Object.fromEntries(ends) };
  });
}

export function toPublicPlan(plan: StoredPlan, answers: Answers): PublicPlan {
  const runs = layOutPlan(plan);
  return {
    n: plan.n,
    proposalId: plan.proposal.id,
    proposal: plan.proposal,
    settingIds: plan.settingIds,
    runs: runs.map(({ order, center, block, wholePlot, coded, actual }) => ({
      order,
      center,
      block,
      ...(wholePlot === undefined ? {} : { wholePlot }),
      coded,
      planned: actual,
    })),
    hardest: hardestMixes(plan, runs),
    hash: plan.hash,
    fits: planFits(plan, answers),
  };
}

function propose(brief: Brief, proposalId: string): Proposal {
  let proposals: Proposal[];
  try {
    proposals = proposePlans(brief);
  } catch (error) {
    if (!(error instanceof PlanError)) throw error;
    const fields = [{ pointer: '#/proposalId', code: 'no-plan-fits' }];
    throw new AppError('invalid', { fields, detail: error.message, cause: error });
  }
  const chosen = proposals.find(({ id }) => id === proposalId);
  if (!chosen) throw new AppError('invalid', { fields: [{ pointer: '#/proposalId', code: 'not-a-choice' }] });
  return chosen;
}

/**
 * Chooses one of the plans that fit the stored answers, and draws its order. What was sent is only the choice: the plan
 * itself is worked out here. An approval that was given for another plan lapses.
 * @throws AppError `invalid` naming the answers or the choice, `not-now`, `changed-meanwhile` with the present state
 */
export async function choosePlan(
  scope: ShopScope,
  choice: ChoosePlan & { trialId: string },
  reader: TrialReader,
): Promise<void> {
  const { trialId, proposalId, revision } = choice;
  await findStep(scope, await findTrialOf(scope, trialId), 'change an answer', reader);
  const { answers, version } = await readStoredAnswers(scope, trialId);
  const read = toBrief(answers);
  if ('problems' in read) throw new AppError('invalid', { fields: toFields(read.problems) });
  // Proposals take a while, so they are worked out before the transaction, on answers that must still stand in it.
  const proposal = propose(read.brief, proposalId);
  const seed = randomInt(seedRange);
  await inTransaction(scope, async (inner) => {
    const trial = await findTrialOf(inner, trialId);
    const step = await findStep(inner, trial, 'change an answer', reader);
    if ((await readStoredAnswers(inner, trialId)).version !== version) {
      throw await changedMeanwhile(inner, trialId);
    }
    const before = await findLatestPlan(inner, trialId);
    await takeStep(inner, trial, step, revision);
    const made = { brief: read.brief, settingIds: read.settingOfLetter, proposal, seed, coreVersion };
    const plan: StoredPlan = {
      ...made,
      id: newId(),
      n: (before?.n ?? 0) + 1,
      phase: trial.phase,
      hash: hashOf(made),
    };
    await insertPlan(inner, { ...plan, trialId, chosenBy: reader.personId });
    const details = {
      n: plan.n,
      runs: proposal.runs,
      seed,
      before: before?.hash ?? null,
      after: plan.hash,
      approvalLapsed: step.from === 'ready',
    };
    await recordActivity(inner, { kind: 'trial.plan-chosen', subjectId: plan.id, trialId, details });
  });
}
