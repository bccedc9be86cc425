import { chooseBlockWords, listConfounded, partOf } from './block-words.ts';
import type { LayoutRow } from './proposal.ts';
import type { RegularPlan } from './regular-plan.ts';
import { chooseWholePlotWords, type WholePlotWords } from './whole-plot-words.ts';
import { type Word, wordOf } from './words.ts';

export interface CornerRows {
  rows: LayoutRow[];
  confoundedWithBlocks: string[];
  /** Present when hard settings are grouped. */
  wholePlots?: { count: number; judged: boolean };
}

interface CornerQuestion {
  plan: RegularPlan;
  replicates: number;
  blocks: number;
  /** Indices of hard settings to be grouped into whole plots; empty: everything is shuffled freely. */
  hard: readonly number[];
}

/**
 * The corners of a regular plan, repeated, split into blocks and grouped into whole plots. Repeats become blocks where their numbers match, which
 * hides nothing; else each repeat is split by words. null where that would hide a main effect, or keep an easy setting the same in each whole plot.
 */
export function arrangeCorners({ plan, replicates, blocks, hard }: CornerQuestion): CornerRows | null {
  const split = splitIntoBlocks({ plan, replicates, blocks, hard });
  if (split === null) return null;
  const grouping = hard.length === 0 ? null : groupFor({ plan, replicates, blocks, hard }, split.words);
  if (grouping === null && hard.length > 0) return null;
  const plotNumbers = new Map<string, number>();
  const rows = Array.from({ length: replicates }, (_, replicate) => replicate).flatMap((replicate) =>
    plan.corners.map((x): LayoutRow => {
      const block = split.blockOf(replicate, x);
      if (grouping === null) return { x, block, center: false };
      const plot = `${replicate}/${block}/${partOf(grouping.words, x)}`;
      if (!plotNumbers.has(plot)) plotNumbers.set(plot, plotNumbers.size + 1);
      return { x, block, wholePlot: plotNumbers.get(plot) ?? 0, center: false };
    }),
  );
  return {
    rows,
    confoundedWithBlocks: listConfounded(plan, split.words),
    ...(grouping === null ? {} : { wholePlots: { count: plotNumbers.size, judged: grouping.judged } }),
  };
}

interface BlockSplit {
  words: Word[];
  blockOf: (replicate: number, corner: readonly number[]) => number;
}

function splitIntoBlocks({ plan, replicates, blocks, hard }: CornerQuestion): BlockSplit | null {
  if (replicates % blocks === 0) {
    return { words: [], blockOf: (replicate) => Math.floor((replicate * blocks) / replicates) + 1 };
  }
  const parts = blocks % replicates === 0 ? blocks / replicates : blocks;
  const words = wordsFor(plan, Math.log2(parts), hard);
  if (words === null) return null;
  const perReplicate = blocks / parts;
  return {
    words,
    blockOf: (replicate, corner) => (replicate % perReplicate) * parts + partOf(words, corner) + 1,
  };
}

// Searches depend on the plan and a few small numbers; the supervisor's sliders ask for the same ones again and again.
const knownBlocks = new WeakMap<RegularPlan, Map<string, Word[] | null>>();
const knownPlots = new WeakMap<RegularPlan, Map<string, WholePlotWords | null>>();

function wordsFor(plan: RegularPlan, count: number, hard: readonly number[]): Word[] | null {
  return rememberFor(knownBlocks, plan, `${count} ${hard.join(' ')}`, () =>
    chooseBlockWords(plan, count, hard.map(wordOf)),
  );
}

function groupFor(
  { plan, replicates, blocks, hard }: CornerQuestion,
  blockWords: Word[],
): WholePlotWords | null {
  return rememberFor(knownPlots, plan, [replicates, blocks, ...hard, '|', ...blockWords].join(' '), () =>
    chooseWholePlotWords({ plan, hard: hard.map(wordOf), blockWords, blocks, replicates }),
  );
}

function rememberFor<Value>(
  memory: WeakMap<RegularPlan, Map<string, Value>>,
  plan: RegularPlan,
  key: string,
  search: () => Value,
): Value {
  const known = memory.get(plan) ?? new Map<string, Value>();
  memory.set(plan, known);
  const found = known.get(key);
  if (found !== undefined) return found;
  const value = search();
  known.set(key, value);
  return value;
}
