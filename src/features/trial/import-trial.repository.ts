import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';
import type { TrialFile } from '../audit/pack/trial-file.schema.ts';
import type { TrialState } from './trial-states.ts';

/** Rows of a trial file with the ids they get here. */
interface Place {
  trialId: string;
  /** Whom rows that must name a person hang on: whoever brings the file in. */
  personId: string;
}

type Ids = ReadonlyMap<number, string>;

function idsOf(items: readonly { n: number }[]): Ids {
  return new Map(items.map(({ n }) => [n, newId()]));
}

/** One statement holds so many values only. */
async function insertAll(scope: ShopScope, table: string, rows: readonly Record<string, unknown>[]) {
  for (let start = 0; start < rows.length; start += 30) {
    await scope.db(table).insert(rows.slice(start, start + 30));
  }
}

async function insertPlans(scope: ShopScope, { trialId, personId }: Place, file: TrialFile): Promise<Ids> {
  const ids = idsOf(file.plans);
  const rows = file.plans.map((plan) => ({
    id: ids.get(plan.n),
    shop_id: scope.shopId,
    trial_id: trialId,
    n: plan.n,
    phase: plan.phase,
    seed: plan.seed,
    core_version: plan.coreVersion,
    brief: JSON.stringify({ v: 1, brief: plan.brief, settingIds: plan.settingIds }),
    proposal: JSON.stringify({ v: 1, proposal: plan.proposal }),
    hash: plan.hash,
    chosen_by: personId,
    created_at: plan.at,
  }));
  await insertAll(scope, 'plans', rows);
  return ids;
}

async function insertStretches(scope: ShopScope, trialId: string, file: TrialFile): Promise<Ids> {
  const ids = idsOf(file.stretches);
  const rows = file.stretches.map((stretch) => ({
    ...stretch,
    id: ids.get(stretch.n),
    shop_id: scope.shopId,
    trial_id: trialId,
  }));
  await insertAll(scope, 'stretches', rows);
  return ids;
}

async function insertRuns(
  scope: ShopScope,
  trialId: string,
  file: TrialFile,
  ids: { plans: Ids; stretches: Ids },
): Promise<void> {
  const runIds = new Map(file.runs.map(({ number }) => [number, newId()]));
  // A run that repeats another comes after it.
  const runs = [...file.runs].sort((one, other) => one.number - other.number);
  const rows = runs.map((run) => ({
    id: runIds.get(run.number),
    shop_id: scope.shopId,
    trial_id: trialId,
    plan_id: ids.plans.get(run.plan),
    number: run.number,
    place: run.place,
    block: run.block,
    whole_plot: run.wholePlot,
    group_key: run.group,
    center: run.center,
    warm_up: run.warmUp,
    coded: JSON.stringify({ v: 1, x: run.coded }),
    planned: JSON.stringify({ v: 1, values: run.planned }),
    actual: run.actual && JSON.stringify({ v: 1, values: run.actual }),
    state: run.state,
    end: run.end,
    gauge: run.gauge,
    label: run.label,
    stretch_id: run.stretch === null ? null : ids.stretches.get(run.stretch),
    repeats_run_id: run.repeats === null ? null : runIds.get(run.repeats),
    asked_at: run.askedAt,
    made_at: run.madeAt,
    measured_at: run.measuredAt,
    closed_at: run.closedAt,
  }));
  await insertAll(scope, 'runs', rows);
  const readings = runs.flatMap((run) => {
    const own = run.readings.map(() => newId());
    return run.readings.map(({ replaces, at, ...reading }, index) => ({
      ...reading,
      id: own[index],
      shop_id: scope.shopId,
      run_id: runIds.get(run.number),
      replaces_id: replaces === null ? null : own[replaces],
      submission: newId(),
      created_at: at,
    }));
  });
  await insertAll(scope, 'readings', readings);
}

async function insertVerdicts(
  scope: ShopScope,
  { trialId, personId }: Place,
  file: TrialFile,
): Promise<void> {
  const ids = idsOf(file.verdicts);
  const own = { shop_id: scope.shopId, trial_id: trialId };
  const verdicts = file.verdicts.map((verdict) => ({
    ...own,
    id: ids.get(verdict.n),
    n: verdict.n,
    input_hash: verdict.inputHash,
    core_version: verdict.coreVersion,
    analysis: JSON.stringify(verdict.analysis),
    facts: JSON.stringify(verdict.facts),
    created_at: verdict.at,
  }));
  await insertAll(scope, 'verdicts', verdicts);
  const decisions = file.decisions.map((decision) => ({
    ...own,
    id: newId(),
    n: decision.n,
    verdict_id: ids.get(decision.verdict),
    outcome: decision.outcome,
    settings: JSON.stringify({ v: 1, values: decision.settings }),
    note: decision.note,
    decided_by: personId,
    decided_at: decision.at,
  }));
  await insertAll(scope, 'decisions', decisions);
}

/** Writes what hangs on a trial that was just added, in the transaction at hand. */
export async function insertTrialFile(scope: ShopScope, place: Place, file: TrialFile): Promise<void> {
  const plans = await insertPlans(scope, place, file);
  const stretches = await insertStretches(scope, place.trialId, file);
  await insertRuns(scope, place.trialId, file, { plans, stretches });
  await insertVerdicts(scope, place, file);
}

/** Where an imported trial goes on from, and since when there has been such a trial. */
export async function setImportedState(
  scope: ShopScope,
  trialId: string,
  stand: { state: TrialState; phase: 'main' | 'check'; createdAt: number },
): Promise<void> {
  await scope
    .db('trials')
    .where({ shop_id: scope.shopId, id: trialId })
    .update({ state: stand.state, phase: stand.phase, created_at: stand.createdAt });
}
