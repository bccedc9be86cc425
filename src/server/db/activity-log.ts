import { createHash } from 'node:crypto';
import type { Knex } from 'knex';
import { z } from 'zod';
import { now } from '../clock.ts';
import { newId } from '../ids.ts';
import { moment } from './columns.ts';
import type { ShopScope } from './scope.ts';

/** A figure, code or id; the log holds no names, phone numbers or free words, so that it can be kept for good. */
export type ActivityDetail =
  | string
  | number
  | boolean
  | null
  | ActivityDetail[]
  | { [field: string]: ActivityDetail };

export interface ActivityEntry {
  /** What happened, as `<noun>.<past participle>`, e.g. `person.added`. */
  kind: string;
  subjectId?: string | null;
  trialId?: string | null;
  details?: { [field: string]: ActivityDetail };
}

const rowSchema = z.object({
  id: z.string(),
  shop_id: z.string(),
  seq: moment,
  at: moment,
  actor_kind: z.string(),
  actor_id: z.string().nullable(),
  kind: z.string(),
  subject_id: z.string().nullable(),
  trial_id: z.string().nullable(),
  details: z.string(),
  prev_hash: z.string(),
  hash: z.string(),
});
export type ActivityRow = z.output<typeof rowSchema>;

/** JSON with sorted keys, so that equal content has equal text and so an equal hash. */
export function canonicalJson(value: ActivityDetail): string {
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
  if (value === null || typeof value !== 'object') return JSON.stringify(value);
  const fields = Object.entries(value)
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([name, inner]) => `${JSON.stringify(name)}:${canonicalJson(inner)}`);
  return `{${fields.join(',')}}`;
}

function hashRow(row: Omit<ActivityRow, 'hash'>): string {
  const { prev_hash, ...content } = row;
  return createHash('sha256').update(prev_hash).update(canonicalJson(content)).digest('hex');
}

/**
 * Adds one line to the shop's activity log, chained to the line before by its hash. Call it in the transaction of the
 * change it tells of: the row of the shop serves as the lock on the chain's head.
 */
export async function recordActivity(scope: ShopScope, entry: ActivityEntry): Promise<void> {
  const { db, shopId, actor } = scope;
  if (!db.isTransaction) throw new RangeError('recordActivity: scope must hold a transaction');
  const [head] = await db('shops')
    .where({ id: shopId })
    .increment('log_seq', 1)
    .returning(['log_seq', 'log_hash']);
  if (!head) throw new RangeError('recordActivity: scope.shopId is not a shop');
  const row = {
    id: newId(),
    shop_id: shopId,
    seq: Number(head.log_seq),
    at: now(),
    actor_kind: actor.kind,
    actor_id: actor.id,
    kind: entry.kind,
    subject_id: entry.subjectId ?? null,
    trial_id: entry.trialId ?? null,
    details: canonicalJson({ v: 1, ...entry.details }),
    prev_hash: String(head.log_hash),
  };
  const hash = hashRow(row);
  await db('activity').insert({ ...row, hash });
  await db('shops').where({ id: shopId }).update({ log_hash: hash });
}

/** Newest first; `before` is the `seq` to go on from. */
export async function listActivity(
  scope: ShopScope,
  query: { limit: number; before?: number; subjectId?: string; trialId?: string },
): Promise<ActivityRow[]> {
  const rows = scope
    .db('activity')
    .where({ shop_id: scope.shopId })
    .orderBy('seq', 'desc')
    .limit(query.limit);
  if (query.before !== undefined) rows.where('seq', '<', query.before);
  if (query.subjectId !== undefined) rows.where({ subject_id: query.subjectId });
  if (query.trialId !== undefined) rows.where({ trial_id: query.trialId });
  return z.array(rowSchema).parse(await rows);
}

export type ChainFinding =
  | { intact: true; lines: number }
  | { intact: false; seq: number; reason: 'missing' | 'altered' | 'head' };

/** Walks the whole chain of a shop and names the first line that was altered or taken away. */
export async function checkActivityChain(scope: Pick<ShopScope, 'db' | 'shopId'>): Promise<ChainFinding> {
  const { db, shopId } = scope;
  const pageSize = 500;
  let seq = 0;
  let hash = '';
  for (;;) {
    const page = z
      .array(rowSchema)
      .parse(
        await db('activity').where({ shop_id: shopId }).where('seq', '>', seq).orderBy('seq').limit(pageSize),
      );
    for (const row of page) {
      if (row.seq !== seq + 1) return { intact: false, seq: seq + 1, reason: 'missing' };
      const { hash: stored, ...content } = row;
      if (row.prev_hash !== hash || hashRow(content) !== stored) {
        return { intact: false, seq: row.seq, reason: 'altered' };
      }
      seq = row.seq;
      hash = stored;
    }
    if (page.length < pageSize) break;
  }
  const head = await db('shops').where({ id: shopId }).first('log_seq', 'log_hash');
  const whole = head && Number(head.log_seq) === seq && head.log_hash === hash;
  return whole ? { intact: true, lines: seq } : { intact: false, seq: seq + 1, reason: 'head' };
}

/** The finding for each shop of the installation, by name. */
export async function checkAllChains(db: Knex): Promise<{ shop: string; finding: ChainFinding }[]> {
  const shops: { id: string; name: string }[] = await db('shops').orderBy('name').select('id', 'name');
  const findings = [];
  for (const { id, name } of shops) {
    findings.push({ shop: name, finding: await checkActivityChain({ db, shopId: id }) });
  }
  return findings;
}
