import { z } from 'zod';
import {
  type Brief,
  briefSchema,
  type PlannedRun,
  type Proposal,
  proposalSchema,
} from '../../lib/doe/index.ts';
import { now } from '../../server/clock.ts';
import { jsonColumn, moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';

const storedBrief = z.object({ v: z.literal(1), brief: briefSchema, settingIds: z.array(z.string()) });
const storedProposal = z.object({ v: z.literal(1), proposal: proposalSchema });

const planRow = z.object({
  id: z.string(),
  n: z.number(),
  phase: z.enum(['main', 'check']),
  seed: moment,
  core_version: z.string(),
  brief: jsonColumn(storedBrief),
  proposal: jsonColumn(storedProposal),
  hash: z.string(),
});

/** A plan that was chosen: all that its runs are laid out from. */
export interface StoredPlan {
  id: string;
  n: number;
  phase: 'main' | 'check';
  seed: number;
  coreVersion: string;
  brief: Brief;
  /** The id of the setting behind each letter. */
  settingIds: string[];
  proposal: Proposal;
  hash: string;
}

/** The plan that was chosen last, if any; of one phase where that is named. */
export async function findLatestPlan(
  scope: ShopScope,
  trialId: string,
  phase?: StoredPlan['phase'],
): Promise<StoredPlan | null> {
  const row: unknown = await scope
    .db('plans')
    .where({ shop_id: scope.shopId, trial_id: trialId, ...(phase ? { phase } : {}) })
    .orderBy('n', 'desc')
    .first();
  if (!row) return null;
  const { id, n, seed, core_version, brief, proposal, hash, ...stored } = planRow.parse(row);
  return {
    id,
    n,
    phase: stored.phase,
    seed,
    coreVersion: core_version,
    brief: brief.brief,
    settingIds: brief.settingIds,
    proposal: proposal.proposal,
    hash,
  };
}

export async function insertPlan(
  scope: ShopScope,
  plan: StoredPlan & { trialId: string; chosenBy: string },
): Promise<void> {
  await scope.db('plans').insert({
    id: plan.id,
    shop_id: scope.shopId,
    trial_id: plan.trialId,
    n: plan.n,
    phase: plan.phase,
    seed: plan.seed,
    core_version: plan.coreVersion,
    brief: JSON.stringify({ v: 1, brief: plan.brief, settingIds: plan.settingIds }),
    proposal: JSON.stringify({ v: 1, proposal: plan.proposal }),
    hash: plan.hash,
    chosen_by: plan.chosenBy,
    created_at: now(),
  });
}

/** What stands in `runs.coded` and `runs.planned`. */
export const codedColumn = jsonColumn(z.object({ v: z.literal(1), x: z.array(z.number()) }));
export const plannedColumn = jsonColumn(
  z.object({ v: z.literal(1), values: z.array(z.union([z.number(), z.string()])) }),
);

/** Writes the runs of a plan, all waiting. `people`: who runs and measures them, where that is one for all. */
export async function insertRuns(
  scope: ShopScope,
  plan: { id: string; trialId: string; runs: readonly PlannedRun[] },
  people: { personId: string | null; measurerId: string | null },
): Promise<void> {
  const rows = plan.runs.map((run) => ({
    id: newId(),
    shop_id: scope.shopId,
    trial_id: plan.trialId,
    plan_id: plan.id,
    number: run.order,
    place: run.order,
    block: run.block,
    whole_plot: run.wholePlot ?? null,
    group_key: run.group,
    center: run.center,
    coded: JSON.stringify({ v: 1, x: run.coded }),
    planned: JSON.stringify({ v: 1, values: run.actual }),
    state: 'waiting',
    person_id: people.personId,
    measurer_id: people.measurerId,
  }));
  // One statement holds so many values only: SQLite takes 999 in its older builds.
  for (let start = 0; start < rows.length; start += 40) {
    await scope.db('runs').insert(rows.slice(start, start + 40));
  }
}

/** The first stretch: runs belong together from the start until something changes. */
export async function insertStart(scope: ShopScope, trialId: string): Promise<void> {
  await scope.db('stretches').insert({
    id: newId(),
    shop_id: scope.shopId,
    trial_id: trialId,
    n: 1,
    kind: 'start',
    words: '',
    at: now(),
  });
}
