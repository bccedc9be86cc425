import { z } from 'zod';
import { now } from '../../server/clock.ts';
import { moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';
import { type Decision, decisionOutcomes } from './decision.ts';

const decisionRow = z.object({ outcome: z.enum(decisionOutcomes), note: z.string(), decided_at: moment });

/** Newest first. */
export async function listDecisions(scope: ShopScope, trialId: string): Promise<Decision[]> {
  const rows: unknown = await scope
    .db('decisions')
    .where({ shop_id: scope.shopId, trial_id: trialId })
    .orderBy('n', 'desc')
    .select('outcome', 'note', 'decided_at');
  return z
    .array(decisionRow)
    .parse(rows)
    .map(({ outcome, note, decided_at }) => ({ outcome, note, at: decided_at }));
}

export async function insertDecision(
  scope: ShopScope,
  decision: {
    trialId: string;
    verdictId: string;
    outcome: Decision['outcome'];
    settings: readonly (number | string)[];
    note: string;
    decidedBy: string;
  },
): Promise<void> {
  const own = { shop_id: scope.shopId, trial_id: decision.trialId };
  const last = await scope.db('decisions').where(own).max({ n: 'n' }).first();
  await scope.db('decisions').insert({
    ...own,
    id: newId(),
    n: Number(last?.['n'] ?? 0) + 1,
    verdict_id: decision.verdictId,
    outcome: decision.outcome,
    settings: JSON.stringify({ v: 1, values: decision.settings }),
    note: decision.note,
    decided_by: decision.decidedBy,
    decided_at: now(),
  });
}
