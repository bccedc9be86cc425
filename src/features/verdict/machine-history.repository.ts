import { z } from 'zod';
import { foldForSearch, jsonColumn, moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { trialStates } from '../trial/trial-states.ts';
import { decisionOutcomes } from './decision.ts';

const machineTrial = z.object({
  id: z.string(),
  number: z.number(),
  title: z.string(),
  state: z.enum(trialStates),
  updated_at: moment,
});

const machineDecision = z.object({
  trial_id: z.string(),
  outcome: z.enum(decisionOutcomes),
  settings: jsonColumn(z.object({ v: z.literal(1), values: z.array(z.union([z.number(), z.string()])) })),
  decided_at: moment,
});
export type MachineDecision = z.output<typeof machineDecision>;

/** A machine's trials, newest first, each with its decisions, newest first. */
export async function listMachineTrials(
  scope: ShopScope,
  machine: string,
): Promise<(z.output<typeof machineTrial> & { decisions: MachineDecision[] })[]> {
  const { db, shopId } = scope;
  const trials = z.array(machineTrial).parse(
    await db('trials')
      .where({ shop_id: shopId, machine_search: foldForSearch(machine) })
      .whereNot({ state: 'draft' })
      .orderBy('number', 'desc')
      .limit(100)
      .select('id', 'number', 'title', 'state', 'updated_at'),
  );
  const ids = trials.map(({ id }) => id);
  const rows: unknown = await db('decisions')
    .where({ shop_id: shopId })
    .whereIn('trial_id', ids)
    .orderBy('n', 'desc')
    .select('trial_id', 'outcome', 'settings', 'decided_at');
  const decisions = z.array(machineDecision).parse(rows);
  return trials.map((trial) => ({
    ...trial,
    decisions: decisions.filter(({ trial_id }) => trial_id === trial.id),
  }));
}
