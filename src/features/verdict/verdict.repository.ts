import type { Knex } from 'knex';
import { z } from 'zod';
import { now } from '../../server/clock.ts';
import { jsonColumn, moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { type StoredVerdict, verdictFactsSchema } from './stored-verdict.ts';

const verdictRow = z.object({
  id: z.string(),
  n: z.number(),
  input_hash: z.string(),
  core_version: z.string(),
  facts: jsonColumn(verdictFactsSchema),
  created_at: moment,
});

function toVerdict(row: unknown): StoredVerdict {
  const { id, n, input_hash, core_version, facts, created_at } = verdictRow.parse(row);
  return { id, n, inputHash: input_hash, coreVersion: core_version, facts, madeAt: created_at };
}

const shown = ['id', 'n', 'input_hash', 'core_version', 'facts', 'created_at'] as const;

/** @param n which one; the latest unless told */
export async function findVerdict(
  scope: ShopScope,
  trialId: string,
  n?: number,
): Promise<StoredVerdict | null> {
  const query = scope.db('verdicts').where({ shop_id: scope.shopId, trial_id: trialId }).orderBy('n', 'desc');
  if (n !== undefined) query.where({ n });
  const row: unknown = await query.first(...shown);
  return row ? toVerdict(row) : null;
}

export async function findVerdictOfInput(
  scope: ShopScope,
  which: { trialId: string; inputHash: string; coreVersion: string },
): Promise<StoredVerdict | null> {
  const row: unknown = await scope
    .db('verdicts')
    .where({
      shop_id: scope.shopId,
      trial_id: which.trialId,
      input_hash: which.inputHash,
      core_version: which.coreVersion,
    })
    .first(...shown);
  return row ? toVerdict(row) : null;
}

export async function insertVerdict(
  scope: ShopScope,
  verdict: Omit<StoredVerdict, 'madeAt'> & { trialId: string; analysis: unknown },
): Promise<void> {
  await scope.db('verdicts').insert({
    id: verdict.id,
    shop_id: scope.shopId,
    trial_id: verdict.trialId,
    n: verdict.n,
    input_hash: verdict.inputHash,
    core_version: verdict.coreVersion,
    analysis: JSON.stringify({ v: 1, results: verdict.analysis }),
    facts: JSON.stringify(verdict.facts),
    created_at: now(),
  });
}

/** Trials whose readings are in and wait for a verdict, in all shops: for the worker. */
export async function listTrialsToJudge(
  db: Knex,
  most: number,
): Promise<{ shopId: string; trialId: string }[]> {
  const rows: unknown = await db('trials')
    .where({ state: 'readings in' })
    .orderBy('updated_at')
    .limit(most)
    .select('shop_id', 'id');
  return z
    .array(z.object({ shop_id: z.string(), id: z.string() }))
    .parse(rows)
    .map(({ shop_id, id }) => ({ shopId: shop_id, trialId: id }));
}
