import { z } from 'zod';
import { now } from '../../server/clock.ts';
import { flag, jsonColumn, moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { codedColumn, plannedColumn } from '../trial/plan.repository.ts';
import { type Run, type RunEnd, type RunState, runEnds, runStates, type SettingValue } from './run.ts';

const settings = jsonColumn(
  z.object({ v: z.literal(1), values: z.array(z.union([z.number(), z.string()])) }),
);

const runRow = z.object({
  id: z.string(),
  trial_id: z.string(),
  plan_id: z.string(),
  number: z.number(),
  place: z.number(),
  block: z.number(),
  whole_plot: z.number().nullable(),
  group_key: z.string(),
  center: flag,
  warm_up: flag,
  coded: codedColumn,
  planned: plannedColumn,
  actual: settings.nullable(),
  state: z.enum(runStates),
  end: z.enum(runEnds).nullable(),
  person_id: z.string().nullable(),
  measurer_id: z.string().nullable(),
  gauge: z.string().nullable(),
  label: z.string().nullable(),
  stretch_id: z.string().nullable(),
  repeats_run_id: z.string().nullable(),
  remind_at: moment.nullable(),
  asked_at: moment.nullable(),
  made_at: moment.nullable(),
  measured_at: moment.nullable(),
  closed_at: moment.nullable(),
  revision: z.number(),
});

export function readRuns(rows: unknown): Run[] {
  return z
    .array(runRow)
    .parse(rows)
    .map((row) => ({
      id: row.id,
      trialId: row.trial_id,
      planId: row.plan_id,
      number: row.number,
      place: row.place,
      block: row.block,
      wholePlot: row.whole_plot,
      group: row.group_key,
      center: row.center,
      warmUp: row.warm_up,
      coded: row.coded.x,
      planned: row.planned.values,
      actual: row.actual?.values ?? null,
      state: row.state,
      end: row.end,
      personId: row.person_id,
      measurerId: row.measurer_id,
      gauge: row.gauge,
      label: row.label,
      stretchId: row.stretch_id,
      repeatsRunId: row.repeats_run_id,
      remindAt: row.remind_at,
      askedAt: row.asked_at,
      madeAt: row.made_at,
      measuredAt: row.measured_at,
      closedAt: row.closed_at,
      revision: row.revision,
    }));
}

export async function findRun(scope: ShopScope, id: string): Promise<Run | null> {
  const [run] = readRuns(await scope.db('runs').where({ shop_id: scope.shopId, id }));
  return run ?? null;
}

/** All runs of a trial, in the order of running. */
export async function listRuns(scope: ShopScope, trialId: string): Promise<Run[]> {
  const own = { shop_id: scope.shopId, trial_id: trialId };
  return readRuns(await scope.db('runs').where(own).orderBy(['place', 'number']));
}

export interface RunChange {
  state?: RunState;
  end?: RunEnd | null;
  actual?: SettingValue[] | null;
  personId?: string | null;
  measurerId?: string | null;
  label?: string | null;
  stretchId?: string | null;
  remindAt?: number | null;
  askedAt?: number | null;
  madeAt?: number | null;
  measuredAt?: number | null;
  closedAt?: number | null;
}

function columnsOf({ actual, ...change }: RunChange): Record<string, unknown> {
  const columns = {
    state: change.state,
    end: change.end,
    person_id: change.personId,
    measurer_id: change.measurerId,
    label: change.label,
    stretch_id: change.stretchId,
    remind_at: change.remindAt,
    asked_at: change.askedAt,
    made_at: change.madeAt,
    measured_at: change.measuredAt,
    closed_at: change.closedAt,
    actual: actual ? JSON.stringify({ v: 1, values: actual }) : actual,
  };
  return Object.fromEntries(Object.entries(columns).filter(([, value]) => value !== undefined));
}

export interface RunCondition {
  id: string;
  /** The states it may be in. */
  from: readonly RunState[];
  /** The revision that was seen; left out where any will do. */
  revision?: number | undefined;
}

/** Changes a run that is still as it was seen, and counts its revision up. @returns whether it was changed */
export async function updateRun(scope: ShopScope, which: RunCondition, change: RunChange): Promise<boolean> {
  const query = scope
    .db('runs')
    .where({ shop_id: scope.shopId, id: which.id })
    .whereIn('state', [...which.from]);
  if (which.revision !== undefined) query.where({ revision: which.revision });
  const changed = await query.update({ ...columnsOf(change), revision: scope.db.raw('revision + 1') });
  return changed > 0;
}

/** Lets every board of the trial see that something on it changed. Every write that a board shows ends here. */
export async function touchBoard(scope: ShopScope, trialId: string): Promise<void> {
  await scope
    .db('trials')
    .where({ shop_id: scope.shopId, id: trialId })
    .update({ board_revision: scope.db.raw('board_revision + 1'), updated_at: now() });
}

export async function readBoardRevision(scope: ShopScope, trialId: string): Promise<number> {
  const row = await scope.db('trials').where({ shop_id: scope.shopId, id: trialId }).first('board_revision');
  return Number(row?.['board_revision'] ?? 0);
}
