import type { VerdictView } from '../../src/features/verdict/verdict-view.ts';
import {
  type AnalysisRun,
  analyze,
  type Brief,
  type CheckReadings,
  judge,
  judgeConfirmation,
  layOutRuns,
  type PlannedRun,
  type Proposal,
  proposePlans,
  type ResponseSpec,
  type ResultInput,
  type Scale,
  settingsToTry,
} from '../../src/lib/doe/index.ts';
import { createNormalSource } from '../../src/lib/doe/random/normal-numbers.ts';
import { createUniformSource } from '../../src/lib/doe/random/random-numbers.ts';

/** What one run read for one result: a mean with its parts, a count, or nothing. */
export type Reading = Pick<AnalysisRun, 'y'> & Partial<Pick<AnalysisRun, 'parts' | 'n' | 'end'>>;

export interface MadeTrial {
  brief: Brief;
  plan: PlannedRun[];
  /** Of each run, result by result. */
  readings: Reading[][];
  checks?: CheckReadings;
  more?: Partial<VerdictView>;
}

const scaleOf: Record<ResponseSpec['kind'], Scale> = {
  measured: 'raw',
  rejects: 'freeman-tukey',
  flaws: 'sqrt',
};

/** Noise and counts from one seed. */
export function luck(seed: number) {
  const uniform = createUniformSource(seed);
  const normal = createNormalSource(uniform);
  return {
    near: (mean: number, sd: number) => mean + sd * normal(),
    parts: (mean: number, sd: number, count: number) =>
      Array.from({ length: count }, () => mean + sd * normal()),
    count: (share: number, lot: number) =>
      Array.from({ length: lot }, uniform).filter((draw) => draw < share).length,
  };
}

/** The plan that is proposed first, or the one that is asked for, laid out with a seed. */
export function planFor(brief: Brief, pick?: (proposal: Proposal) => boolean): PlannedRun[] {
  const proposals = proposePlans(brief);
  const proposal = (pick && proposals.find(pick)) ?? proposals[0];
  if (!proposal) throw new RangeError('planFor: no plan fits the brief');
  return layOutRuns(brief, proposal, 20261201);
}

function toResult(
  brief: Brief,
  plan: readonly PlannedRun[],
  spec: ResponseSpec,
  readings: Reading[],
): ResultInput {
  const hasBlocks = new Set(plan.map(({ block }) => block)).size > 1;
  const input = {
    factors: brief.factors.map(({ kind }, place) => ({ letter: String.fromCharCode(65 + place), kind })),
    scale: scaleOf[spec.kind],
    runs: plan.map((run, index) => ({
      x: run.coded,
      group: run.group,
      center: run.center,
      order: run.order,
      ...(hasBlocks && { block: run.block }),
      ...(readings[index] ?? { y: null }),
    })),
  };
  return { spec, input, analysis: analyze(input) };
}

export function resultsOf({ brief, plan, readings }: MadeTrial): ResultInput[] {
  return [brief.response, ...brief.watch].map((spec, result) =>
    toResult(
      brief,
      plan,
      spec,
      readings.map((run) => run[result] ?? { y: null }),
    ),
  );
}

/** The verdict of a trial as its page gets it: planned, read and judged by the core itself. */
export function makeView(trial: MadeTrial): VerdictView {
  const { brief, plan, readings, checks, more } = trial;
  const results = resultsOf(trial);
  const bet = settingsToTry(brief, results);
  return {
    trialId: '0190b6d2-0000-7000-8000-000000000001',
    number: 7,
    title: 'Line 3 seals',
    machine: 'Line 3',
    madeAt: Date.UTC(2026, 2, 12, 15, 30),
    n: 1,
    state: 'deciding',
    isLatest: true,
    brief,
    verdict: judge(brief, plan, results),
    bet,
    confirmation: checks ? judgeConfirmation(brief, bet, checks) : null,
    panelNames: brief.factors.map((factor) => factor.panelName ?? factor.name),
    units: brief.factors.map((factor) => (factor.kind === 'number' ? factor.unit : '')),
    runs: plan.map((run, index) => ({
      number: run.order,
      order: run.order,
      planned: run.actual,
      coded: run.coded,
      readings: (readings[index] ?? []).map(({ y, parts }) => (parts ? [...parts] : y === null ? [] : [y])),
      end: readings[index]?.[0]?.end ?? (readings[index]?.[0]?.y == null ? 'notRun' : 'measured'),
    })),
    usual: brief.factors.map((factor) =>
      factor.kind === 'number' ? factor.usual : factor.usual === 'low' ? factor.low : factor.high,
    ),
    hazards: [
      { hazard: 'hotParts', cautions: ['guardsClosed', 'heatGloves'], protects: '' },
      { hazard: 'movingParts', cautions: [], protects: 'Two-hand start' },
    ],
    stop: { picked: ['smoke', 'jam'], own: '' },
    call: [
      { when: 'Day', whom: 'Dana, ext 12' },
      { when: 'Night', whom: 'Lee, ext 14' },
    ],
    partsFate: 'hold',
    value: { partsPerWeek: null, costOfBadPart: null, currency: 'USD' },
    hours: 3,
    decisions: [],
    mayDecide: true,
    reviewDue: false,
    endedEarly: false,
    plannedRuns: plan.length,
    ...more,
  };
}
