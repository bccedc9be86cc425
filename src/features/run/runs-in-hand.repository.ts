import type { Knex } from 'knex';
import { z } from 'zod';
import type { ShopScope } from '../../server/db/scope.ts';
import { readRuns } from './run.repository.ts';
import type { Run } from './run.ts';

/** Trials whose runs may be made or sent in. */
const going = ['running', 'paused', 'held'] as const;
/** Trials in which a number may still be put right by whoever sent it. */
const undecided = [...going, 'readings in', 'verdict review', 'deciding'] as const;

function trialsIn(scope: ShopScope, states: readonly string[]) {
  return scope
    .db('trials')
    .where({ shop_id: scope.shopId })
    .whereIn('state', [...states])
    .select('id');
}

/** What a person has to make or to measure, over all trials that are going on; the run to make first. */
export async function listRunsInHand(scope: ShopScope, personId: string): Promise<Run[]> {
  const rows = await scope
    .db('runs')
    .where({ shop_id: scope.shopId })
    .whereIn('trial_id', trialsIn(scope, going))
    .andWhere((open) =>
      open
        .where((make) => make.where({ person_id: personId }).whereIn('state', ['asked', 'doubtful']))
        .orWhere((measure) =>
          measure.where({ measurer_id: personId }).whereIn('state', ['made', 'doubtful']),
        ),
    )
    .orderBy(['made_at', 'place']);
  const rank = ({ state }: Run) => (state === 'asked' ? 0 : 1);
  return readRuns(rows).sort((one, other) => rank(one) - rank(other));
}

/** The runs that closed in a person's hands, the last first, of trials that are not decided yet. */
export async function listClosedRunsOf(scope: ShopScope, personId: string): Promise<Run[]> {
  const rows = await scope
    .db('runs')
    .where({ shop_id: scope.shopId })
    .whereIn('state', ['done', 'skipped'])
    .whereIn('trial_id', trialsIn(scope, undecided))
    .andWhere((own) => own.where({ person_id: personId }).orWhere({ measurer_id: personId }))
    .orderBy('closed_at', 'desc')
    .limit(50);
  return readRuns(rows);
}

/** Whether this phone has a run to make, in whatever trial. */
export async function hasRunToMake(scope: ShopScope, personId: string): Promise<boolean> {
  const found = await scope
    .db('runs')
    .where({ shop_id: scope.shopId, person_id: personId, state: 'asked' })
    .first('id');
  return found !== undefined;
}

const dueRow = z.object({ shop_id: z.string(), id: z.string() });

/** Runs whose reminder is due, in trials that are running. */
export async function listDueReminders(db: Knex, at: number): Promise<{ shopId: string; runId: string }[]> {
  const rows: unknown = await db('runs')
    .join('trials', (on) => on.on('trials.shop_id', 'runs.shop_id').andOn('trials.id', 'runs.trial_id'))
    .whereIn('runs.state', ['asked', 'made', 'doubtful'])
    .where('runs.remind_at', '<=', at)
    .where('trials.state', 'running')
    .orderBy('runs.remind_at')
    .limit(100)
    .select('runs.shop_id', 'runs.id');
  return z
    .array(dueRow)
    .parse(rows)
    .map(({ shop_id, id }) => ({ shopId: shop_id, runId: id }));
}

/** Trials that are running and have a run waiting. */
export async function listTrialsToServe(db: Knex): Promise<{ shopId: string; trialId: string }[]> {
  const rows: unknown = await db('trials')
    .where({ state: 'running' })
    .whereExists(
      db('runs')
        .whereRaw('runs.shop_id = trials.shop_id and runs.trial_id = trials.id')
        .where({ 'runs.state': 'waiting' })
        .select('runs.id'),
    )
    .orderBy('id')
    .select('shop_id', 'id');
  return z
    .array(dueRow)
    .parse(rows)
    .map(({ shop_id, id }) => ({ shopId: shop_id, trialId: id }));
}
