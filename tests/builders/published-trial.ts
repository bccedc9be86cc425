import { insertAnswers } from '../../src/features/trial/answers.repository.ts';
import { insertPlan, insertRuns } from '../../src/features/trial/plan.repository.ts';
import { hashOf } from '../../src/features/trial/reviewed-hash.service.ts';
import { insertTrial } from '../../src/features/trial/trial.repository.ts';
import {
  analyze,
  type Brief,
  coreVersion,
  decode,
  type FactorSpec,
  type PlannedRun,
  type Proposal,
} from '../../src/lib/doe/index.ts';
import type { ShopScope } from '../../src/server/db/scope.ts';
import { newId } from '../../src/server/ids.ts';
import { finishedAnswers } from './answers.ts';
import { type Example, referenceExamples } from './reference-examples.ts';

/** How a published data set was run, beyond what its file says. */
export interface PublishedRun {
  id: string;
  blocks?: boolean;
  /** The letter that changes between whole plots only; each level of it in each replicate is one. */
  hard?: string;
}

const builtAt = Date.UTC(2026, 0, 5, 8);

function toFactor({ kind, letter }: { kind: string; letter: string }): FactorSpec {
  const name = `Setting ${letter}`;
  if (kind === 'categorical') return { kind: 'choice', name, low: 'first', high: 'second', usual: 'low' };
  return { kind: 'number', name, unit: 'u', low: 160, high: 180, usual: 165 };
}

function toBrief(example: Example): Brief {
  const kind = example.kind === 'binomial' ? 'rejects' : 'measured';
  const lots = kind === 'rejects' ? { lotSize: 50, usualRate: 0.2 } : {};
  return {
    response: {
      name: 'Result',
      unit: 'u',
      kind,
      goal: 'more',
      worthHaving: kind === 'rejects' ? 0.1 : 1,
      ...lots,
    },
    watch: [],
    factors: (example.factors ?? []).map(toFactor),
    forbidden: [],
    budget: { maxRuns: 64 },
    noise: null,
  };
}

/** The runs as their file lists them; coded settings stand as reached. */
function toPlannedRuns(example: Example, brief: Brief, { blocks, hard }: PublishedRun): PlannedRun[] {
  const letters = (example.factors ?? []).map(({ letter }) => letter);
  const copies = new Map<string, number>();
  return example.runs.map((run, index) => {
    const reached = letters.map((letter) => run.coded?.[letter] ?? 0);
    const coded = reached.map((level) => Math.max(-1, Math.min(1, Math.round(level))));
    const copy = (copies.get(coded.join(' ')) ?? 0) + 1;
    copies.set(coded.join(' '), copy);
    const level = hard === undefined ? 0 : (run.coded?.[hard] ?? 0);
    return {
      order: index + 1,
      standard: index + 1,
      block: blocks ? (run.block ?? 1) : 1,
      ...(hard === undefined ? {} : { wholePlot: 2 * copy + (level > 0 ? 1 : 0) }),
      group: coded.join(' '),
      center: run.centre ?? false,
      coded,
      actual: brief.factors.map((factor, place) => decode(factor, coded[place] ?? 0)),
    };
  });
}

/** The plan as this product would have stored it: its error plan decided from where the runs are. */
function toProposal(brief: Brief, runs: readonly PlannedRun[]): Proposal {
  const input = {
    factors: brief.factors.map(({ kind }, place) => ({ letter: String.fromCharCode(65 + place), kind })),
    runs: runs.map(({ coded, block, wholePlot, center, group }) => ({
      x: coded,
      y: 0,
      group,
      center,
      ...(new Set(runs.map((run) => run.block)).size > 1 ? { block } : {}),
      ...(wholePlot === undefined ? {} : { wholePlot }),
    })),
  };
  const { errorPlan, terms, aliases, confoundedWithBlocks } = analyze(input);
  return {
    id: 'published',
    k: brief.factors.length,
    baseRuns: runs.length,
    replicates: 1,
    centerPoints: runs.filter(({ center }) => center).length,
    blocks: new Set(runs.map(({ block }) => block)).size,
    runs: runs.length,
    generators: [],
    definingWords: [],
    resolution: Number.POSITIVE_INFINITY,
    aliases,
    confoundedWithBlocks,
    errorPlan,
    detectable: [],
    powerAtWorthHaving: null,
    recommended: true,
    reasons: [],
    warnings: [],
    terms: terms.map(({ term }) => term),
    layout: runs.map(({ coded, block, wholePlot, center }) => ({
      x: coded,
      block,
      center,
      ...(wholePlot === undefined ? {} : { wholePlot }),
    })),
  };
}

/** A published data set as a trial of this shop with all its readings in; answers its id. */
export async function buildPublishedTrial(
  scope: ShopScope,
  about: PublishedRun & { ownerId: string },
): Promise<string> {
  const { db, shopId } = scope;
  const example = referenceExamples.find(({ id }) => id === about.id);
  if (!example) throw new RangeError(`buildPublishedTrial: no example ${about.id}`);
  const brief = toBrief(example);
  const runs = toPlannedRuns(example, brief, about);
  const proposal = toProposal(brief, runs);
  const [id, planId] = [newId(), newId()];
  await insertTrial(scope, { id, ownerId: about.ownerId, title: about.id, machine: 'Press' });
  await insertAnswers(scope, id, { answers: finishedAnswers(), questions: {}, savedBy: about.ownerId });
  const made = { brief, settingIds: brief.factors.map(({ name }) => name), proposal, seed: 1, coreVersion };
  const plan = { ...made, id: planId, n: 1, phase: 'main', hash: hashOf(made) } as const;
  await insertPlan(scope, { ...plan, trialId: id, chosenBy: about.ownerId });
  await insertRuns(scope, { id: planId, trialId: id, runs }, { personId: null, measurerId: null });
  const rows: { id: string; number: number }[] = await db('runs').where({ trial_id: id }).orderBy('number');
  for (const { id: runId, number } of rows) {
    const source = example.runs[number - 1];
    const reached = brief.factors.map((factor, place) =>
      decode(factor, source?.coded?.[String.fromCharCode(65 + place)] ?? 0),
    );
    const actual = JSON.stringify({ v: 1, values: reached });
    await db('runs').where({ id: runId }).update({ state: 'done', end: 'measured', actual });
    const figure = source?.n === undefined ? { value: source?.y } : { rejects: source.y, lot: source.n };
    await db('readings').insert({
      ...figure,
      id: newId(),
      shop_id: shopId,
      run_id: runId,
      result: 0,
      part: 1,
      state: 'counts',
      source: 'csv',
      submission: newId(),
      created_at: builtAt,
    });
  }
  await db('trials').where({ id }).update({ state: 'readings in' });
  return id;
}
