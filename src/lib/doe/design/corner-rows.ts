import { chooseBlockWords, listConfounded, partOf } from './block-words.ts';
import type { LayoutRow } from './proposal.ts';
import type { RegularPlan } from './regular-plan.ts';
import { chooseWholePlotWords } from './whole-plot-words.ts';
import type { Word } from './words.ts';

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
 * hides nothing; else each repeat is split by words. null where that would hide a main effect.
 */
export function arrangeCorners({ plan, replicates, blocks, hard }: CornerQuestion): CornerRows | null {
  const split = splitIntoBlocks(plan, replicates, blocks);
  if (split === null) return null;
  const grouping =
    hard.length === 0
      ? null
      : chooseWholePlotWords({
          plan,
          hard: hard.map((index) => 1 << index),
          blockWords: split.words,
          blocks,
          replicates,
        });
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

function splitIntoBlocks(plan: RegularPlan, replicates: number, blocks: number): BlockSplit | null {
  if (replicates % blocks === 0) {
    return { words: [], blockOf: (replicate) => Math.floor((replicate * blocks) / replicates) + 1 };
  }
  const parts = blocks % replicates === 0 ? blocks / replicates : blocks;
  const words = wordsFor(plan, Math.log2(parts));
  if (words === null) return null;
  const perReplicate = blocks / parts;
  return {
    words,
    blockOf: (replicate, corner) => (replicate % perReplicate) * parts + partOf(words, corner) + 1,
  };
}

// The search depends on the plan alone; the supervisor's sliders ask for the same few plans again and again.
const knownWords = new WeakMap<RegularPlan, Map<number, Word[] | null>>();

function wordsFor(plan: RegularPlan, count: number): Word[] | null {
  const known = knownWords.get(plan) ?? new Map<number, Word[] | null>();
  knownWords.set(plan, known);
  const words = known.has(count) ? (known.get(count) ?? null) : chooseBlockWords(plan, count);
  known.set(count, words);
  return words;
}
