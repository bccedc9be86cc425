import { insertAnswers } from '../../src/features/trial/answers.repository.ts';
import type { Answers, QuestionName } from '../../src/features/trial/answers.schema.ts';
import {
  insertPlan,
  insertRuns,
  insertStart,
  type StoredPlan,
} from '../../src/features/trial/plan.repository.ts';
import { hashOf } from '../../src/features/trial/reviewed-hash.service.ts';
import { toBrief } from '../../src/features/trial/to-brief.ts';
import { insertTrial } from '../../src/features/trial/trial.repository.ts';
import type { TrialState } from '../../src/features/trial/trial-states.ts';
import { coreVersion, layOutRuns, type PlannedRun, proposePlans } from '../../src/lib/doe/index.ts';
import { recordActivity } from '../../src/server/db/activity-log.ts';
import type { ShopScope } from '../../src/server/db/scope.ts';
import { newId } from '../../src/server/ids.ts';

const startedAgo = 3 * 86_400_000;
const runMilliseconds = 20 * 60_000;

/** What a run gave, result by result: parts of the main one, then rejects out of a lot for a watched one. */
export type ReadDemoRun = (run: PlannedRun) => { parts: number[]; rejects?: number; lot?: number };

/** Adds a draft with its answers. */
export async function addDraft(scope: ShopScope, about: { ownerId: string; answers: Answers; at: number }) {
  const { answers, ownerId, at } = about;
  const id = newId();
  await recordActivity(scope, { kind: 'trial.added', subjectId: id, trialId: id });
  await insertTrial(scope, {
    id,
    ownerId,
    title: answers.job?.title ?? '',
    machine: answers.job?.machine ?? '',
  });
  const state = { version: 1, savedAt: at, savedBy: ownerId, saves: [] };
  const names = Object.keys(answers) as QuestionName[];
  const questions = Object.fromEntries(names.map((name) => [name, state]));
  await insertAnswers(scope, id, { answers, questions, savedBy: ownerId });
  return id;
}

/** Adds a trial that was started: its plan is the one that the product would recommend. */
export async function addStarted(
  scope: ShopScope,
  about: { ownerId: string; runnerId: string; answers: Answers; seed: number; at: number },
): Promise<{ trialId: string; plan: StoredPlan; runs: PlannedRun[] }> {
  const { ownerId, runnerId, seed, at } = about;
  const answers: Answers = {
    ...about.answers,
    crew: {
      shifts: [{ id: 'day', name: 'Day', from: '06:00', to: '14:00', runs: runnerId, calls: ownerId }],
      ways: { [runnerId]: 'text' },
    },
    ready: { ticked: ['guardsOn', 'crewMaySayNo', 'boxAndLabels', 'enoughMaterial', 'gaugeChecked'] },
  };
  const read = toBrief(answers);
  const [proposal] = 'brief' in read ? proposePlans(read.brief) : [];
  if (!('brief' in read) || !proposal) throw new RangeError('addStarted: about.answers give no plan');
  const trialId = await addDraft(scope, { ownerId, answers, at: at - startedAgo });
  const plan: StoredPlan = {
    id: newId(),
    n: 1,
    phase: 'main',
    seed,
    coreVersion,
    brief: read.brief,
    settingIds: read.settingOfLetter,
    proposal,
    hash: hashOf({ brief: read.brief, proposal, seed }),
  };
  await insertPlan(scope, { ...plan, trialId, chosenBy: ownerId });
  const runs = layOutRuns(read.brief, proposal, seed);
  await insertRuns(scope, { id: plan.id, trialId, runs }, { personId: runnerId, measurerId: runnerId });
  await insertStart(scope, trialId);
  const frozen = { frozen_hash: hashOf(answers) };
  await scope.db('answers').where({ shop_id: scope.shopId, trial_id: trialId }).update(frozen);
  return { trialId, plan, runs };
}

/** Ends the first `count` runs of a plan with their readings, one every twenty minutes from three days ago. */
export async function readFirstRuns(
  scope: ShopScope,
  about: { planId: string; runs: readonly PlannedRun[]; count: number; read: ReadDemoRun; at: number },
): Promise<void> {
  const { db, shopId } = scope;
  for (const run of about.runs.slice(0, about.count)) {
    const made = about.at - startedAgo + run.order * runMilliseconds;
    const row = await db('runs')
      .where({ shop_id: shopId, plan_id: about.planId, place: run.order })
      .first('id');
    await db('runs').where({ shop_id: shopId, id: row.id }).update({
      state: 'done',
      end: 'measured',
      asked_at: made,
      made_at: made,
      measured_at: made,
      closed_at: made,
    });
    const { parts, rejects, lot } = about.read(run);
    const base = { shop_id: shopId, run_id: row.id, state: 'counts', source: 'board', created_at: made };
    const rows = parts.map((value, part) => ({
      ...base,
      id: newId(),
      result: 0,
      part,
      value,
      submission: newId(),
    }));
    await db('readings').insert(rows);
    if (rejects === undefined) continue;
    const counted = { result: 1, part: 0, rejects, lot: lot ?? null, submission: newId() };
    await db('readings').insert({ ...base, ...counted, id: newId() });
  }
}

export async function setState(scope: ShopScope, trialId: string, state: TrialState): Promise<void> {
  await scope.db('trials').where({ shop_id: scope.shopId, id: trialId }).update({ state });
}
