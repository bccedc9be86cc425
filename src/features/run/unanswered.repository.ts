import { z } from 'zod';
import { moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { messageStates } from '../message/message.ts';
import type { Run } from './run.ts';

/** Texts that want an answer for a run, and the word to whoever is called that none came. */
const wanting = ['runPrompt', 'resultsWanted', 'remind'];
const escalated = 'noAnswer';
const mostUndelivered = 2;

const textRow = z.object({
  run_id: z.string(),
  template: z.string(),
  state: z.enum(messageStates),
  created_at: moment,
});

export type Unanswered = 'undelivered' | 'reminded';

/** Open runs for which no answer will come by itself, with why. */
export async function listUnanswered(
  scope: ShopScope,
  runs: readonly Run[],
): Promise<ReadonlyMap<string, Unanswered>> {
  const open = runs.filter(({ state }) => state === 'asked' || state === 'made');
  const rows = z.array(textRow).parse(
    await scope
      .db('messages')
      .where({ shop_id: scope.shopId, channel: 'text' })
      .whereIn(
        'run_id',
        open.map(({ id }) => id),
      )
      .whereIn('template', [...wanting, escalated])
      .orderBy('id')
      .select('run_id', 'template', 'state', 'created_at'),
  );
  const found = new Map<string, Unanswered>();
  for (const run of open) {
    const since = run.madeAt ?? run.askedAt ?? 0;
    const own = rows.filter(({ run_id, created_at }) => run_id === run.id && created_at >= since);
    const failed = own.filter(({ template, state }) => template !== escalated && state === 'failed').length;
    if (failed >= mostUndelivered) found.set(run.id, 'undelivered');
    else if (run.remindAt === null && own.some(({ template }) => template === escalated)) {
      found.set(run.id, 'reminded');
    }
  }
  return found;
}
