import { z } from 'zod';
import { now } from '../../server/clock.ts';
import { moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';
import {
  type Figure,
  type Reading,
  type ReadingSource,
  type ReadingState,
  readingSources,
  readingStates,
} from './run.ts';

const readingRow = z.object({
  id: z.string(),
  run_id: z.string(),
  result: z.number(),
  part: z.number(),
  value: z.number().nullable(),
  rejects: z.number().nullable(),
  lot: z.number().nullable(),
  state: z.enum(readingStates),
  source: z.enum(readingSources),
  inbox_text_id: z.string().nullable(),
  entered_by: z.string().nullable(),
  reason: z.string().nullable(),
  replaces_id: z.string().nullable(),
  submission: z.string(),
  created_at: moment,
});

function readReadings(rows: unknown): Reading[] {
  return z
    .array(readingRow)
    .parse(rows)
    .map((row) => ({
      id: row.id,
      runId: row.run_id,
      result: row.result,
      part: row.part,
      value: row.value,
      rejects: row.rejects,
      lot: row.lot,
      state: row.state,
      source: row.source,
      inboxTextId: row.inbox_text_id,
      enteredBy: row.entered_by,
      reason: row.reason,
      replacesId: row.replaces_id,
      submission: row.submission,
      createdAt: row.created_at,
    }));
}

/** Every reading of these runs, whatever became of it, oldest first. */
export async function listReadings(scope: ShopScope, runIds: readonly string[]): Promise<Reading[]> {
  const found: Reading[] = [];
  // One statement holds so many values only.
  for (let start = 0; start < runIds.length; start += 200) {
    const rows = await scope
      .db('readings')
      .where({ shop_id: scope.shopId })
      .whereIn('run_id', runIds.slice(start, start + 200))
      .orderBy('id');
    found.push(...readReadings(rows));
  }
  return found;
}

/** What one submission says of each of its figures, so that each has a name of its own. */
function submissionOf(submission: string, { result, part }: Pick<Figure, 'result' | 'part'>): string {
  return `${submission}:${result}:${part}`;
}

/** Whether this very submission was stored before, for this run. */
export async function hasSubmission(scope: ShopScope, runId: string, submission: string): Promise<boolean> {
  const row: unknown = await scope
    .db('readings')
    .where({ shop_id: scope.shopId, run_id: runId })
    .whereLike('submission', `${submission}:%`)
    .first('id');
  return row !== undefined;
}

export interface NewReading extends Figure {
  state: ReadingState;
  source: ReadingSource;
  inboxTextId?: string | null;
  enteredBy?: string | null;
  reason?: string | null;
  replacesId?: string | null;
  submission: string;
}

/** Adds one reading. Rows are only added; afterwards nothing but `state` changes. @returns its id */
export async function insertReading(scope: ShopScope, runId: string, reading: NewReading): Promise<string> {
  const id = newId();
  await scope.db('readings').insert({
    id,
    shop_id: scope.shopId,
    run_id: runId,
    result: reading.result,
    part: reading.part,
    value: reading.value,
    rejects: reading.rejects,
    lot: reading.lot,
    state: reading.state,
    source: reading.source,
    inbox_text_id: reading.inboxTextId ?? null,
    entered_by: reading.enteredBy ?? null,
    reason: reading.reason ?? null,
    replaces_id: reading.replacesId ?? null,
    submission: submissionOf(reading.submission, reading),
    created_at: now(),
  });
  return id;
}

export async function setReadingStates(
  scope: ShopScope,
  ids: readonly string[],
  state: ReadingState,
): Promise<void> {
  if (ids.length === 0) return;
  await scope
    .db('readings')
    .where({ shop_id: scope.shopId })
    .whereIn('id', [...ids])
    .update({ state });
}
