import { chooseIndependent, fixesOtherSetting, spanChains } from './block-words.ts';
import type { RegularPlan } from './regular-plan.ts';
import { lengthOfWord, spanWords, type Word } from './words.ts';

export interface WholePlotWords {
  /** Runs with the same signs of these words, in the same repeat, share a whole plot. */
  words: Word[];
  /** Whether each hard setting can be judged: two whole plots or more at each of its levels, and contrasts between whole plots left for error. */
  judged: boolean;
}

interface WholePlotQuestion {
  plan: RegularPlan;
  /** One-letter words of the settings that are hard to change. */
  hard: readonly Word[];
  /** Words that already split the plan into blocks; whole plots lie within blocks. */
  blockWords: readonly Word[];
  /** Blocks in all, those made of whole repeats included. */
  blocks: number;
  replicates: number;
}

const enoughDf = 2;

/**
 * How to group the corners of a regular plan so that hard settings change seldom: the fewest whole plots that leave two or more contrasts among them
 * for error; failing that, those that leave most.
 *
 * No main effect of an easy setting is ever put between whole plots, and as few pairs as possible. null where it cannot be helped, as where two hard
 * settings multiply to a third, or where each whole plot would be a single run and nothing would be grouped.
 */
export function chooseWholePlotWords(question: WholePlotQuestion): WholePlotWords | null {
  const { plan, hard, blockWords } = question;
  const needed = independent(plan, [...hard, ...blockWords]);
  const free = plan.chains.map((chain) => chain[0] ?? 0);
  let best: { words: Word[]; df: number; pairs: number } | null = null;
  // At least two runs stay within each whole plot.
  const most = Math.log2(plan.corners.length) - 1 - needed.length;
  for (let extra = 0; extra <= most && (best?.df ?? 0) < enoughDf; extra++) {
    for (const words of chooseIndependent(plan, free, extra, needed)) {
      const count = judgeWords(question, words);
      if (count === null || count.df < 1) continue;
      const better =
        best === null || count.df > best.df || (count.df === best.df && count.pairs < best.pairs);
      if (better) best = { words, ...count };
    }
  }
  if (best !== null) return { words: best.words, judged: true };
  const groupsNothing = 2 ** needed.length >= plan.corners.length;
  return groupsNothing || fixesOtherSetting(plan, needed, hard) ? null : { words: needed, judged: false };
}

function independent(plan: RegularPlan, words: readonly Word[]): Word[] {
  const kept: Word[] = [];
  for (const word of words) {
    const spanned = new Set([...spanWords(kept)].map((member) => plan.chainOf[member] ?? -1));
    if (!spanned.has(plan.chainOf[word] ?? -1)) kept.push(word);
  }
  return kept;
}

/** Degrees of freedom for error among whole plots, and pairs judged there; null where an easy main effect would fall there too. */
function judgeWords(
  { plan, hard, blockWords, blocks, replicates }: WholePlotQuestion,
  words: readonly Word[],
): { df: number; pairs: number } | null {
  const plots = 2 ** words.length * replicates;
  if (plots < 4) return null;
  if (fixesOtherSetting(plan, words, hard)) return null;
  const chains = spanChains(plan, words);
  const hidden = new Set(spanChains(plan, blockWords));
  const tested = chains.filter((chain) => !hidden.has(chain) && lengthOfWord(chain[0] ?? 0) <= 2);
  return { df: plots - blocks - tested.length, pairs: tested.length };
}
