import { z } from 'zod';
import { flag, jsonColumn } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import type { CountedReading, VerdictRun } from './verdict-runs.ts';

const settings = z.array(z.union([z.number(), z.string()]));

const runRow = z.object({
  id: z.string(),
  number: z.number(),
  place: z.number(),
  block: z.number(),
  whole_plot: z.number().nullable(),
  group_key: z.string(),
  center: flag,
  coded: jsonColumn(z.object({ v: z.literal(1), x: z.array(z.number()) })),
  planned: jsonColumn(z.object({ v: z.literal(1), values: settings })),
  actual: jsonColumn(z.object({ v: z.literal(1), values: settings })).nullable(),
  end: z.enum(['measured', 'notRun', 'failed', 'beyondGauge']).nullable(),
});

const readingRow = z.object({
  run_id: z.string(),
  result: z.number(),
  part: z.number(),
  value: z.number().nullable(),
  rejects: z.number().nullable(),
  lot: z.number().nullable(),
});

async function listCounted(
  scope: ShopScope,
  runIds: readonly string[],
): Promise<Map<string, CountedReading[]>> {
  const rows: unknown = await scope
    .db('readings')
    .where({ shop_id: scope.shopId, state: 'counts' })
    .whereIn('run_id', [...runIds])
    .orderBy(['run_id', 'result', 'part'])
    .select('run_id', 'result', 'part', 'value', 'rejects', 'lot');
  const byRun = new Map<string, CountedReading[]>();
  for (const { run_id, ...reading } of z.array(readingRow).parse(rows)) {
    byRun.set(run_id, [...(byRun.get(run_id) ?? []), reading]);
  }
  return byRun;
}

/** The runs of one phase with their readings that count, in the order of running. Warm-up runs do not count. */
export async function listVerdictRuns(
  scope: ShopScope,
  trialId: string,
  phase: 'main' | 'check',
): Promise<VerdictRun[]> {
  const { db, shopId } = scope;
  const plans = db('plans').where({ shop_id: shopId, trial_id: trialId, phase }).select('id');
  const rows: unknown = await db('runs')
    .where({ shop_id: shopId, trial_id: trialId, warm_up: false })
    .whereIn('plan_id', plans)
    .orderBy(['place', 'number']);
  const runs = z.array(runRow).parse(rows);
  const readings = await listCounted(
    scope,
    runs.map(({ id }) => id),
  );
  return runs.map((run) => ({
    id: run.id,
    number: run.number,
    place: run.place,
    block: run.block,
    wholePlot: run.whole_plot,
    group: run.group_key,
    center: run.center,
    coded: run.coded.x,
    planned: run.planned.values,
    actual: run.actual?.values ?? null,
    end: run.end,
    readings: readings.get(run.id) ?? [],
  }));
}
