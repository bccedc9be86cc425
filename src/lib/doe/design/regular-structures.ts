import type { Brief } from '../brief.ts';
import { spanChains } from './block-words.ts';
import { catalogue } from './catalogue.ts';
import { arrangeCorners } from './corner-rows.ts';
import { isForbidden } from './forbidden.ts';
import { buildRegularPlan, listAliases, type RegularPlan, writeDefiningWords } from './regular-plan.ts';
import type { Structure } from './structure.ts';
import { lengthOfWord, readWord, writeWord } from './words.ts';

const mostCorners = 32;

/**
 * All regular structures for a brief: each plan of the catalogue, as often as it goes into 32 corners, freely shuffled and, with hard settings, in
 * whole plots. With rules, the signs of the generators are tried until no corner is forbidden.
 */
export function listRegularStructures(brief: Brief): Structure[] {
  const k = brief.factors.length;
  const hard = brief.factors.flatMap((factor, index) => (factor.hardToChange ? [index] : []));
  return catalogue
    .filter((entry) => entry.k === k)
    .flatMap((entry) => findAllowedPlan(brief, k, entry.generators) ?? [])
    .flatMap((plan) =>
      listReplicates(plan).flatMap((replicates) => {
        const groupings = hard.length > 0 ? [[], hard] : [[]];
        return groupings.flatMap((grouped) => describe({ brief, plan, replicates, grouped }) ?? []);
      }),
    );
}

function listReplicates(plan: RegularPlan): number[] {
  const most = mostCorners / plan.corners.length;
  return [1, 2, 3, 4, 6, 8, 12, 16].filter(
    (replicates) => replicates <= most && plan.corners.length * replicates >= 4,
  );
}

// Plans depend on nothing but their generators, so each is built once a process.
const builtPlans = new Map<string, RegularPlan>();

function findAllowedPlan(brief: Brief, k: number, generators: readonly string[]): RegularPlan | null {
  const choices = brief.forbidden.length === 0 ? 1 : 2 ** generators.length;
  for (let signs = 0; signs < choices; signs++) {
    const signed = generators.map((generator, index) =>
      (signs >> index) & 1 ? generator.replace('=', '=-') : generator,
    );
    const key = `${k} ${signed.join(' ')}`;
    const plan = builtPlans.get(key) ?? buildRegularPlan(k, signed);
    builtPlans.set(key, plan);
    if (!plan.corners.some((x) => isForbidden(brief, x))) return plan;
  }
  return null;
}

interface Choice {
  brief: Brief;
  plan: RegularPlan;
  replicates: number;
  /** Hard settings to be grouped. */
  grouped: readonly number[];
}

function describe({ brief, plan, replicates, grouped }: Choice): Structure | null {
  const blocks = brief.blocks?.count ?? 1;
  const arranged = arrangeCorners({ plan, replicates, blocks, hard: grouped });
  if (arranged === null) return null;
  return {
    k: plan.k,
    baseRuns: plan.corners.length,
    replicates,
    blocks,
    generators: plan.generators,
    definingWords: writeDefiningWords(plan.definingWords),
    resolution: plan.resolution,
    aliases: listAliases(plan),
    confoundedWithBlocks: arranged.confoundedWithBlocks,
    terms: listTestedTerms(plan, arranged.confoundedWithBlocks),
    corners: arranged.rows,
    ...(arranged.wholePlots === undefined ? {} : { wholePlots: arranged.wholePlots }),
  };
}

/** The first word of each chain that holds a main effect or a pair, unless blocks hide it. */
function listTestedTerms(plan: RegularPlan, confounded: readonly string[]): string[] {
  const hidden = new Set(spanChains(plan, confounded.map(readWord)));
  return plan.chains
    .filter((chain) => lengthOfWord(chain[0] ?? 0) <= 2 && !hidden.has(chain))
    .map((chain) => writeWord(chain[0] ?? 0));
}
