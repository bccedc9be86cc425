import type { Brief } from '../brief.ts';
import { decideErrorPlan } from './error-plan.ts';
import { addMiddles, listMiddles, middleStep } from './middle-runs.ts';
import type { ErrorPlan, LayoutRow } from './proposal.ts';
import type { Structure } from './structure.ts';
import { expectTimeAndMoney, type TimeAndMoney } from './time-and-money.ts';
import { lettersUpTo } from './words.ts';

/** A structure with its middle runs, its error and what it takes. */
export interface Candidate extends TimeAndMoney {
  structure: Structure;
  centerPoints: number;
  rows: LayoutRow[];
  errorPlan: ErrorPlan;
}

const fewestMiddles = 3;
const mostMiddles = 8;
const enoughDf = 3;

/**
 * Completes a structure with the fewest middle runs, three or more, that give its effects an error of three degrees of freedom; where the limits forbid
 * that, with as many as they allow. null when even the corners alone do not fit.
 */
export function completeStructure(
  brief: Brief,
  structure: Structure,
  fits: (candidate: { runs: number } & TimeAndMoney) => boolean,
): Candidate | null {
  const counts = listMiddleCounts(brief, structure);
  const tryCount = (count: number) => {
    if (structure.corners.length + count > brief.budget.maxRuns) return null;
    const rows = addMiddles(brief, structure.corners, count);
    const takes = expectTimeAndMoney(brief, rows);
    return fits({ runs: rows.length, ...takes }) ? { structure, centerPoints: count, rows, ...takes } : null;
  };
  const judge = (plan: Omit<Candidate, 'errorPlan'>): Candidate => ({
    ...plan,
    errorPlan: errorPlanOf(structure.k, plan.rows),
  });

  let best: Candidate | null = null;
  for (const count of counts.filter((enough) => enough >= fewestMiddles)) {
    const plan = tryCount(count);
    if (plan === null) break;
    best = judge(plan);
    if (hasEnoughError(best.errorPlan)) return best;
  }
  if (best !== null) return best;
  for (const count of counts.filter((few) => few < fewestMiddles).toReversed()) {
    const plan = tryCount(count);
    if (plan !== null) return judge(plan);
  }
  return null;
}

// An error plan follows from the layout alone, and sliders lay out the same structures again and again.
const knownErrorPlans = new Map<string, ErrorPlan>();
const mostKnown = 500;

function errorPlanOf(k: number, rows: readonly LayoutRow[]): ErrorPlan {
  const key = rows.map((row) => `${row.x.join()} ${row.block} ${row.wholePlot} ${row.center}`).join(';');
  const plan = knownErrorPlans.get(key) ?? decideErrorPlan(lettersUpTo(k), rows);
  if (knownErrorPlans.size >= mostKnown) knownErrorPlans.clear();
  knownErrorPlans.set(key, plan);
  return structuredClone(plan);
}

/** Whether effects are judged on an error with degrees of freedom of its own, three or more; with whole plots, those of easy settings. */
export function hasEnoughError({ rung, df, strata }: ErrorPlan): boolean {
  const sub = strata?.find(({ name }) => name === 'sub');
  const judged = sub ?? { rung, df };
  return judged.rung.startsWith('replicates') && (judged.df ?? 0) >= enoughDf;
}

/** The same structure without middle runs: the least it could take. */
export function completeBarely(brief: Brief, structure: Structure): { runs: number } & TimeAndMoney {
  return { runs: structure.corners.length, ...expectTimeAndMoney(brief, structure.corners) };
}

function listMiddleCounts(brief: Brief, structure: Structure): number[] {
  if (listMiddles(brief).length === 0) return [0];
  const step = middleStep(brief, structure.blocks, structure.wholePlots !== undefined);
  // More middles than places between corners would stand side by side.
  const most = Math.min(Math.max(mostMiddles, 2 * step), structure.corners.length + structure.blocks);
  return Array.from({ length: Math.floor(most / step) + 1 }, (_, index) => index * step);
}
