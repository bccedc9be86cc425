import type { Brief } from '../brief.ts';
import { fixesOtherSetting, spanChains } from './block-words.ts';
import { catalogue } from './catalogue.ts';
import { arrangeCorners } from './corner-rows.ts';
import { isForbidden } from './forbidden.ts';
import { reassignPair } from './reassign-letters.ts';
import { buildRegularPlan, listAliases, type RegularPlan, writeDefiningWords } from './regular-plan.ts';
import type { Structure } from './structure.ts';
import { lengthOfWord, readWord, wordOf, writeWord } from './words.ts';

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
    .flatMap((entry) => {
      const shuffled = findAllowedPlans(brief, [entry.generators]);
      const grouped = findAllowedPlans(brief, listAssignments(k, entry.generators, hard)).filter(
        (plan) => !fixesOtherSetting(plan, [], hard.map(wordOf)),
      );
      return listReplicates(entry.runs).flatMap((replicates) => [
        ...shuffled.flatMap((plan) => describe({ brief, plan, replicates, grouped: [] }) ?? []),
        ...chooseGrouped(
          grouped.flatMap((plan) => describe({ brief, plan, replicates, grouped: hard }) ?? []),
        ),
      ]);
    });
}

/** The columns that hard settings may have. One by itself stands as well in any; two must not make a third by their product. */
function listAssignments(
  k: number,
  generators: readonly string[],
  hard: readonly number[],
): (readonly string[])[] {
  const [first, second] = hard;
  if (first === undefined) return [];
  return second === undefined ? [generators] : reassignPair(k, generators, [first, second]);
}

/** Of one plan with its columns given out in different ways, the first that judges the hard settings, else the first. */
function chooseGrouped(structures: readonly Structure[]): Structure[] {
  const [first] = structures;
  if (first === undefined) return [];
  return [structures.find(({ wholePlots }) => wholePlots?.judged) ?? first];
}

function listReplicates(corners: number): number[] {
  const most = mostCorners / corners;
  return [1, 2, 3, 4, 6, 8, 12, 16].filter((replicates) => replicates <= most && corners * replicates >= 4);
}

// Plans depend on nothing but their generators, so each is built once a process.
const builtPlans = new Map<string, RegularPlan>();

/** Of each set of generators the plan with the first signs that no rule stands against. */
function findAllowedPlans(brief: Brief, assignments: readonly (readonly string[])[]): RegularPlan[] {
  return assignments.flatMap((generators) => findAllowedPlan(brief, generators) ?? []);
}

function findAllowedPlan(brief: Brief, generators: readonly string[]): RegularPlan | null {
  const k = brief.factors.length;
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
