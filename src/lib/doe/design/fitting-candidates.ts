import type { Brief } from '../brief.ts';
import { type Candidate, completeBarely, completeStructure, hasEnoughError } from './candidate.ts';
import { findMisfit, findTightLimit, findWeightiestRule } from './explain-misfit.ts';
import { listIrregularStructures } from './irregular-structures.ts';
import { listMiddles } from './middle-runs.ts';
import { PlanError } from './plan-error.ts';
import { listRegularStructures } from './regular-structures.ts';
import type { Structure } from './structure.ts';

/**
 * Every plan within the limits, completed with middle runs. Plans without an error of their own stay only where no repeat of them fits.
 *
 * @throws PlanError that names the limit to relax and the least it would need.
 */
export function listFittingCandidates(brief: Brief): Candidate[] {
  const structures = listStructures(brief);
  const candidates = structures
    .flatMap(
      (structure) =>
        completeStructure(brief, structure, (takes) => findTightLimit(brief, takes) === null) ?? [],
    )
    .filter(mayBeUsed);
  if (candidates.length === 0) throw explainMisfit(brief, structures);
  const settled = candidates.filter(
    (candidate) =>
      !hasBetterRepeat(brief, candidate, candidates) && !hasBetterFraction(candidate, candidates),
  );
  const judged = settled.filter(({ errorPlan }) => errorPlan.rung !== 'none');
  return judged.length > 0 ? judged : settled;
}

function listStructures(brief: Brief): Structure[] {
  const regular = listRegularStructures(brief);
  if (brief.forbidden.length === 0) return regular;
  const servesWell = regular.some(({ resolution }) => resolution >= 4);
  const structures = servesWell ? regular : [...regular, ...listIrregularStructures(brief)];
  if (structures.length === 0)
    throw new PlanError({
      code: 'too-much-forbidden',
      field: `forbidden.${findWeightiestRule(brief)}`,
      need: null,
    });
  return structures;
}

/** Pseudo error needs the symmetry of regular plans. */
function mayBeUsed({ structure, errorPlan }: Candidate): boolean {
  return structure.irregular === undefined || hasEnoughError(errorPlan);
}

/** Where every setting is a choice, a plan without an error of its own gives way to its repeat. */
function hasBetterRepeat(brief: Brief, candidate: Candidate, candidates: readonly Candidate[]): boolean {
  if (listMiddles(brief).length > 0 || hasEnoughError(candidate.errorPlan)) return false;
  return candidates.some(
    (other) =>
      isAlike(other.structure, candidate.structure) &&
      other.structure.baseRuns === candidate.structure.baseRuns &&
      other.structure.replicates > candidate.structure.replicates &&
      hasEnoughError(other.errorPlan),
  );
}

/** A small fraction run again and again gives way to a larger one with as many corners, which ties less and knows main effects as well. */
function hasBetterFraction({ structure, rows }: Candidate, candidates: readonly Candidate[]): boolean {
  return candidates.some(
    (other) =>
      isAlike(other.structure, structure) &&
      other.structure.corners.length === structure.corners.length &&
      tiedness(other.structure) < tiedness(structure) &&
      other.structure.confoundedWithBlocks.length <= structure.confoundedWithBlocks.length &&
      other.rows.length <= rows.length + 1 &&
      hasEnoughError(other.errorPlan),
  );
}

function isAlike(first: Structure, second: Structure): boolean {
  return (
    first.wholePlots?.judged === second.wholePlots?.judged &&
    (first.irregular === undefined) === (second.irregular === undefined)
  );
}

/** 0: pairs apart; 1: pairs tied; 2: main effects tied. */
function tiedness({ resolution }: Structure): number {
  return resolution >= 5 ? 0 : resolution === 4 ? 1 : 2;
}

function explainMisfit(brief: Brief, structures: readonly Structure[]): PlanError {
  const unlimited = { ...brief, budget: { ...brief.budget, maxRuns: Number.MAX_SAFE_INTEGER } };
  const least = structures.flatMap((structure) => {
    if (structure.irregular === undefined) return completeBarely(brief, structure);
    const complete = completeStructure(unlimited, structure, () => true);
    return complete === null || !mayBeUsed(complete) ? [] : { ...complete, runs: complete.rows.length };
  });
  return findMisfit(brief, least);
}
