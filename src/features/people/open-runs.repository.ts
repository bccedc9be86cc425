import { z } from 'zod';
import type { ShopScope } from '../../server/db/scope.ts';

/** A run that is not over and hangs on a person, with the trial whose board hands it over. */
const openRunRow = z.object({
  run_id: z.string(),
  number: z.number(),
  trial_id: z.string(),
  title: z.string(),
});

export interface OpenRun {
  runId: string;
  number: number;
  trialId: string;
  trialTitle: string;
}

const shownAtMost = 20;

/** The open runs of a person, to make or to measure. */
export async function listOpenRuns(scope: ShopScope, personId: string): Promise<OpenRun[]> {
  const rows = await scope
    .db('runs')
    .join('trials', (on) => on.on('trials.shop_id', 'runs.shop_id').andOn('trials.id', 'runs.trial_id'))
    .where({ 'runs.shop_id': scope.shopId })
    .whereNotIn('runs.state', ['done', 'skipped'])
    .where((held) => held.where('runs.person_id', personId).orWhere('runs.measurer_id', personId))
    .orderBy(['trials.number', 'runs.place'])
    .limit(shownAtMost)
    .select('runs.id as run_id', 'runs.number', 'trials.id as trial_id', 'trials.title');
  return z
    .array(openRunRow)
    .parse(rows)
    .map((row) => ({
      runId: row.run_id,
      number: row.number,
      trialId: row.trial_id,
      trialTitle: row.title,
    }));
}
