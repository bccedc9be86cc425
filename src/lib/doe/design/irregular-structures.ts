import { listTerms } from '../analysis/terms.ts';
import type { Brief } from '../brief.ts';
import { groupBy } from './group-by.ts';
import { expandPoint } from './information.ts';
import { findIrregularPlans, type IrregularPlan } from './irregular-plan.ts';
import { listMiddles } from './middle-runs.ts';
import type { LayoutRow } from './proposal.ts';
import { splitEvenly } from './split-evenly.ts';
import type { Structure } from './structure.ts';
import { lettersUpTo } from './words.ts';

const mostCorners = 32;

/** Structures around forbidden corners, freely shuffled and, with hard settings and no blocks, in whole plots. */
export function listIrregularStructures(brief: Brief): Structure[] {
  // Without middle runs only repeats can tell the error.
  const repeats = listMiddles(brief).length > 0 ? [1] : [1, 2];
  return plansAround(brief).flatMap((plan) =>
    repeats.flatMap((replicates) => {
      const corners = Array.from({ length: replicates }, () => plan.corners).flat();
      const question = { brief, plan, replicates };
      const shuffled = describe(question, splitIntoBlocks(brief, corners));
      const grouped = groupIntoPlots(brief, corners);
      return grouped === null
        ? [shuffled]
        : [shuffled, { ...describe(question, grouped.rows), wholePlots: grouped.wholePlots }];
    }),
  );
}

// The search depends on the rules alone and is the longest part of planning; sliders move limits, not rules.
const knownPlans = new Map<string, IrregularPlan[]>();
const mostKnown = 4;

function plansAround(brief: Brief): IrregularPlan[] {
  const key = JSON.stringify([brief.factors.length, brief.forbidden]);
  const plans = knownPlans.get(key) ?? findIrregularPlans(brief, mostCorners);
  knownPlans.delete(key);
  knownPlans.set(key, plans);
  for (const oldest of [...knownPlans.keys()].slice(0, -mostKnown)) knownPlans.delete(oldest);
  return plans;
}

function describe(
  { brief, plan, replicates }: { brief: Brief; plan: IrregularPlan; replicates: number },
  rows: LayoutRow[],
): Structure {
  return {
    k: brief.factors.length,
    baseRuns: plan.corners.length,
    replicates,
    blocks: brief.blocks?.count ?? 1,
    generators: [],
    definingWords: [],
    resolution: plan.resolution,
    aliases: plan.aliases,
    confoundedWithBlocks: [],
    terms: plan.terms,
    corners: rows,
    irregular: { efficiencies: plan.efficiencies, emptied: plan.emptied },
  };
}

function splitIntoBlocks(brief: Brief, corners: readonly number[][]): LayoutRow[] {
  const parts = splitEvenly(termColumns(brief, corners), corners.length, brief.blocks?.count ?? 1);
  return corners.map((x, row) => ({ x, block: (parts[row] ?? 0) + 1, center: false }));
}

interface Plots {
  rows: LayoutRow[];
  wholePlots: { count: number; judged: boolean };
}

/**
 * Two whole plots for each combination of the hard settings, alike in all easy ones; where that would keep an easy setting the same within each whole
 * plot, one. null where one would do so too, with blocks, or without hard settings.
 */
function groupIntoPlots(brief: Brief, corners: readonly number[][]): Plots | null {
  const hard = brief.factors.flatMap((factor, index) => (factor.hardToChange ? [index] : []));
  if (hard.length === 0 || (brief.blocks?.count ?? 1) > 1) return null;
  const easy = brief.factors.flatMap((factor, index) => (factor.hardToChange ? [] : [index]));
  const groups = groupBy(corners, (x) => hard.map((index) => x[index]).join(' '));
  const plots = [2, 1].map((parts) => splitGroups(brief, groups, parts));
  return plots.find(({ rows }) => changeWithinPlots(rows, easy)) ?? null;
}

function splitGroups(brief: Brief, groups: readonly (readonly number[][])[], most: number): Plots {
  const rows: LayoutRow[] = [];
  let plots = 0;
  for (const corners of groups) {
    const parts = corners.length >= 4 ? most : 1;
    const split = splitEvenly(termColumns(brief, corners), corners.length, parts);
    for (const [row, x] of corners.entries())
      rows.push({ x, block: 1, wholePlot: plots + (split[row] ?? 0) + 1, center: false });
    plots += parts;
  }
  return { rows, wholePlots: { count: plots, judged: plots >= 2 * groups.length } };
}

/** Whether each of some settings changes within one whole plot or more. A setting that never does is hard to change, whatever it was called. */
function changeWithinPlots(rows: readonly LayoutRow[], settings: readonly number[]): boolean {
  const plots = groupBy(rows, (row) => row.wholePlot);
  return (
    plots.some((plot) => plot.length > 1) &&
    settings.every((setting) =>
      plots.some((plot) => plot.some((row) => row.x[setting] !== plot[0]?.x[setting])),
    )
  );
}

/** Main effects count more than pairs: their columns are given twice the weight. */
function termColumns(brief: Brief, corners: readonly number[][]): number[][] {
  const letters = lettersUpTo(brief.factors.length);
  return listTerms(letters, 2).map((term) =>
    corners.map((x) => (term.length === 1 ? 2 : 1) * (expandPoint(x, [term])[1] ?? 0)),
  );
}
