import type { Knex } from 'knex';
import { judgeTrial } from '../src/features/verdict/judge-trial.service.ts';
import { insertVerdict } from '../src/features/verdict/verdict.repository.ts';
import { listVerdictRuns } from '../src/features/verdict/verdict-runs.repository.ts';
import type { PlannedRun } from '../src/lib/doe/index.ts';
import { now } from '../src/server/clock.ts';
import { recordActivity } from '../src/server/db/activity-log.ts';
import type { ShopScope } from '../src/server/db/scope.ts';
import { newId } from '../src/server/ids.ts';
import { addDraft, addStarted, type ReadDemoRun, readFirstRuns, setState } from './demo-trials/add-trial.ts';
import { cloudySoup, leanerSeals, weakSeals } from './demo-trials/answers.ts';

// One trial that has its verdict, one that runs and one that was only begun, so that every screen has something to show.

/** Ups and downs that are the same each time: a figure between -1 and 1 from a run's place and a part. */
function wobble(place: number, part: number): number {
  return Math.sin(place * 12.9898 + part * 78.233);
}

const oneDecimal = (value: number) => Math.round(value * 10) / 10;
const level = ({ coded }: PlannedRun, place: number) => coded[place] ?? 0;

const readSeals: ReadDemoRun = (run) => {
  const [temp, dwell] = [level(run, 0), level(run, 1)];
  const mean = 35.4 + 3.1 * temp + 1.7 * dwell + 0.2 * level(run, 2) + 0.9 * wobble(run.order, 0);
  const parts = [1, 2, 3].map((part) => oneDecimal(mean + 1.2 * wobble(run.order, part)));
  return { parts, rejects: temp + dwell === 2 ? 4 : run.order % 3 === 0 ? 1 : 2, lot: 50 };
};

const readScrap: ReadDemoRun = (run) => ({
  parts: [oneDecimal(14 - 0.8 * level(run, 1) + 0.9 * wobble(run.order, 4))],
});

async function findPeople(
  knex: Knex,
): Promise<{ scope: ShopScope; ownerId: string; runnerId: string } | null> {
  const shop = await knex('shops').where({ name: 'Harrow Lane Foods' }).first('id');
  if (!shop) return null;
  const scope: ShopScope = { db: knex, shopId: shop.id, actor: { kind: 'command', id: null } };
  const owner = await knex('people')
    .where({ shop_id: shop.id, email: 'dana@harrowlane.example' })
    .first('id');
  const runner = await knex('people').where({ shop_id: shop.id, kind: 'line phone' }).first('id');
  return owner && runner ? { scope, ownerId: owner.id, runnerId: runner.id } : null;
}

async function addVerdict(
  scope: ShopScope,
  trialId: string,
  started: Awaited<ReturnType<typeof addStarted>>,
) {
  const runs = await listVerdictRuns(scope, trialId, 'main');
  const { brief, proposal } = started.plan;
  const judgement = judgeTrial({ brief, proposal, runs, checkRuns: [] });
  if (!judgement) throw new RangeError('addVerdict: the demo trial has no readings');
  const { results, ...made } = judgement;
  await insertVerdict(scope, { ...made, id: newId(), trialId, n: 1, analysis: results });
  await recordActivity(scope, { kind: 'verdict.made', subjectId: trialId, trialId, details: { n: 1 } });
  await setState(scope, trialId, 'deciding');
}

export async function seed(knex: Knex): Promise<void> {
  if (await knex('trials').first('id')) return;
  await knex.transaction(async (transaction) => {
    const found = await findPeople(transaction);
    if (!found) return;
    const { scope, ownerId, runnerId } = found;
    const at = now();
    const about = { ownerId, runnerId, at };
    const ended = await addStarted(scope, { ...about, answers: weakSeals, seed: 11 });
    const count = ended.runs.length;
    await readFirstRuns(scope, { planId: ended.plan.id, runs: ended.runs, count, read: readSeals, at });
    await addVerdict(scope, ended.trialId, ended);
    const running = await addStarted(scope, { ...about, answers: leanerSeals, seed: 12 });
    await readFirstRuns(scope, {
      planId: running.plan.id,
      runs: running.runs,
      count: 4,
      read: readScrap,
      at,
    });
    await setState(scope, running.trialId, 'running');
    await addDraft(scope, { ownerId, answers: cloudySoup, at });
  });
}
