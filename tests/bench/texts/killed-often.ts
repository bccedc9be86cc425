import { setTimeout as wait } from 'node:timers/promises';
import type { Knex } from 'knex';
import { createUniformSource } from '../../../src/lib/doe/random/random-numbers.ts';
import type { StandIns } from '../../integration/stand-ins.ts';
import { type AnsweringPhones, startPhones } from './answering-phones.ts';
import { buildCrowd, type CrowdMember, runsATrial } from './crowd.ts';
import { openTwoPrograms, type Role } from './two-programs.ts';

export interface KillPlan {
  kills: number;
  trials: number;
  seed: number;
  limitMilliseconds: number;
}

export interface KillOutcome {
  kills: { web: number; worker: number };
  seconds: number;
  /** Runs of all trials, and those whose text reached its phone. */
  runs: number;
  reached: number;
  /** Texts that the service handed to a phone a second time. */
  duplicates: number;
  /** Runs with exactly the figure that their phone sent, kept once; and readings kept besides. */
  keptOnce: number;
  keptBesides: number;
  /** Webhooks that nobody heard, because the program was dead. */
  missed: number;
}

/** How long a program lives at most while no texts pass. */
const longestLifeMilliseconds = 6_000;

/** Lets a random number of texts pass, then a random part of what one takes on its way. */
async function liveAWhile(random: () => number, mostTexts: number, phones: AnsweringPhones): Promise<void> {
  const began = Date.now();
  const until = phones.passed() + 1 + Math.floor(random() * mostTexts);
  while (phones.passed() < until && Date.now() - began < longestLifeMilliseconds) await wait(20);
  await wait(random() * 60);
}

/** Kills web and worker side by side at random moments; the worker last, so that it looks for what nobody heard. */
async function killAll(
  plan: KillPlan,
  product: { standIns: StandIns; kill(role: Role): Promise<void> },
  phones: AnsweringPhones,
): Promise<KillOutcome['kills'] & { missed: number }> {
  const { kills, trials, seed } = plan;
  const web = Math.floor(kills * 0.4);
  // Each run has a text out and one back; the killing is to last for most of them.
  const texts = trials * runsATrial * 2;
  // Counted as it goes, since the service keeps only the latest.
  const missed = new Set<number>();
  const killRole = async (role: Role, times: number): Promise<void> => {
    const random = createUniformSource(seed + (role === 'web' ? 1 : 2));
    for (let time = 0; time < times; time += 1) {
      await liveAWhile(random, (1.6 * texts) / times, phones);
      // Late and mixed up by turns.
      const isReversed = random() < 0.5;
      await product.standIns.setFaults({
        delayWebhooks: { upToMilliseconds: 250 },
        reverseWebhooks: { gatherMilliseconds: isReversed ? 80 : 0 },
      });
      await product.kill(role);
      for (const { number, outcome } of await product.standIns.deliveries()) {
        if (outcome === 'missed') missed.add(number);
      }
    }
  };
  await Promise.all([killRole('web', web), killRole('worker', kills - web - 1)]);
  await product.kill('worker');
  return { web, worker: kills - web, missed: missed.size };
}

async function countOpenRuns(db: Knex, crowd: readonly CrowdMember[]): Promise<number> {
  const ids = crowd.map(({ trialId }) => trialId);
  const row = await db('runs').whereIn('trial_id', ids).whereNot({ state: 'done' }).count({ n: '*' }).first();
  return Number(row?.['n']);
}

/** How the readings in the database compare with what the phones sent. */
async function compareReadings(db: Knex, crowd: readonly CrowdMember[], phones: AnsweringPhones) {
  const phoneOf = new Map(crowd.map(({ trialId, phone }) => [trialId, phone]));
  const rows = await db('readings')
    .join('runs', 'runs.id', 'readings.run_id')
    .whereIn('runs.trial_id', [...phoneOf.keys()])
    .select('runs.trial_id', 'runs.number', 'readings.value', 'readings.state');
  const valuesOf = new Map<string, number[]>();
  for (const { trial_id, number, value, state } of rows) {
    const key = `${phoneOf.get(trial_id)} ${number}`;
    if (state === 'counts') valuesOf.set(key, [...(valuesOf.get(key) ?? []), value]);
  }
  const keptOnce = [...phones.answered].filter(([key, figure]) => {
    const values = valuesOf.get(key) ?? [];
    return values.length === 1 && values[0] === figure;
  }).length;
  return { keptOnce, keptBesides: rows.length - keptOnce };
}

/** Runs a crowd's trials to their end while web and worker are killed again and again. */
export async function runWhileKilled(plan: KillPlan): Promise<KillOutcome> {
  const product = await openTwoPrograms((db) => buildCrowd(db, { shops: 1, each: plan.trials }));
  try {
    const { standIns, db, prepared: crowd } = product;
    const began = Date.now();
    await standIns.setFaults({ duplicateWebhooks: true, delayWebhooks: { upToMilliseconds: 250 } });
    const phones = startPhones(standIns, crowd);
    const { missed, ...kills } = await killAll(plan, product, phones);
    while ((await countOpenRuns(db, crowd)) > 0 && Date.now() - began < plan.limitMilliseconds) {
      await wait(250);
    }
    await phones.stop();
    const { prompts } = phones;
    return {
      kills,
      seconds: Math.round((Date.now() - began) / 1000),
      runs: plan.trials * runsATrial,
      reached: prompts.size,
      duplicates: [...prompts.values()].reduce((sum, times) => sum + times - 1, 0),
      ...(await compareReadings(db, crowd, phones)),
      missed,
    };
  } finally {
    await product.close();
  }
}
