import { insertAnswers } from '../../src/features/trial/answers.repository.ts';
import type { Answers } from '../../src/features/trial/answers.schema.ts';
import { insertPlan, insertRuns, insertStart } from '../../src/features/trial/plan.repository.ts';
import { hashOf } from '../../src/features/trial/reviewed-hash.service.ts';
import { toBrief } from '../../src/features/trial/to-brief.ts';
import { insertTrial } from '../../src/features/trial/trial.repository.ts';
import { layOutRuns, type PlannedRun, proposePlans } from '../../src/lib/doe/index.ts';
import type { ShopScope } from '../../src/server/db/scope.ts';
import { newId } from '../../src/server/ids.ts';
import { finishedAnswers } from './answers.ts';

const builtAt = Date.UTC(2026, 0, 5, 8);
const runMilliseconds = 15 * 60_000;

/** The figure of a run of the main result; null leaves the run out. */
export type ReadRun = (run: Pick<PlannedRun, 'order' | 'coded' | 'group'>) => number | null;

/** Gives every run of a phase that waits its figure, as if it had been typed on the board. */
export async function measureRuns(scope: ShopScope, trialId: string, read: ReadRun): Promise<void> {
  const { db, shopId } = scope;
  const rows = await db('runs')
    .where({ shop_id: shopId, trial_id: trialId, state: 'waiting' })
    .orderBy('number');
  for (const row of rows) {
    const value = read({ order: row.place, coded: JSON.parse(row.coded).x, group: row.group_key });
    const at = builtAt + row.place * runMilliseconds;
    const ended =
      value === null
        ? { state: 'skipped', end: 'notRun', closed_at: at }
        : { state: 'done', end: 'measured', asked_at: at, made_at: at, measured_at: at, closed_at: at };
    await db('runs').where({ shop_id: shopId, id: row.id }).update(ended);
    if (value === null) continue;
    await db('readings').insert({
      id: newId(),
      shop_id: shopId,
      run_id: row.id,
      result: 0,
      part: 0,
      value,
      state: 'counts',
      source: 'board',
      submission: newId(),
      created_at: at,
    });
  }
}

/** A trial that has just been started, with the recommended plan of its answers; answers its id. */
export async function buildRunningTrial(
  scope: ShopScope,
  about: { ownerId: string; answers?: Answers; seed?: number; personId?: string },
): Promise<string> {
  const shift = { id: 'day', name: 'Day', from: '06:00', to: '14:00', runs: about.ownerId };
  const answers = finishedAnswers({ crew: { shifts: [shift] }, ...about.answers });
  const read = toBrief(answers);
  if ('problems' in read) throw new RangeError(`buildRunningTrial: ${JSON.stringify(read.problems)}`);
  const [proposal] = proposePlans(read.brief);
  if (!proposal) throw new RangeError('buildRunningTrial: no plan fits');
  const id = newId();
  const seed = about.seed ?? 1;
  await insertTrial(scope, { id, ownerId: about.ownerId, title: 'Line 3 seals', machine: 'Line 3' });
  await insertAnswers(scope, id, { answers, questions: {}, savedBy: about.ownerId });
  const plan = {
    id: newId(),
    n: 1,
    phase: 'main',
    seed,
    coreVersion: '1',
    brief: read.brief,
    settingIds: read.settingOfLetter,
    proposal,
    hash: hashOf(proposal),
  } as const;
  await insertPlan(scope, { ...plan, trialId: id, chosenBy: about.ownerId });
  const runs = layOutRuns(read.brief, proposal, seed);
  await insertStart(scope, id);
  const personId = about.personId ?? null;
  await insertRuns(scope, { id: plan.id, trialId: id, runs }, { personId, measurerId: personId });
  await scope.db('trials').where({ shop_id: scope.shopId, id }).update({ state: 'running' });
  return id;
}

/** A trial whose readings are in; answers its id. */
export async function buildMeasuredTrial(
  scope: ShopScope,
  about: { ownerId: string; read: ReadRun; answers?: Answers; seed?: number },
): Promise<string> {
  const id = await buildRunningTrial(scope, about);
  await measureRuns(scope, id, about.read);
  await scope.db('trials').where({ shop_id: scope.shopId, id }).update({ state: 'readings in' });
  return id;
}
