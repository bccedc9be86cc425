import { type Analysis, AnalysisError, type AnalysisInput } from './analysis.ts';
import { analyze } from './analyze.ts';
import { compareTerms, completeHierarchy } from './terms.ts';
import { type Transform, transformFigure } from './transforms.ts';

/** Another model of the same readings. */
export interface AlternativeWish {
  terms: readonly string[];
  /** true: terms stand as named, though a parent of theirs is missing. */
  refuseHierarchy?: boolean;
  transform?: Transform;
  /** Places of runs that are left out. */
  without?: readonly number[];
  /** One a run: the stretch it was made in, to be taken as blocks within the blocks of the plan. */
  stretches?: readonly string[];
  error?: 'ladder' | 'residual';
}

export interface Alternative {
  input: AnalysisInput;
  analysis: Analysis;
  /** Terms that the hierarchy added to those asked for. */
  added: string[];
}

/**
 * Works out another model. The error ladder is decided anew from the runs that are left, as blocks and left-out runs change what repeats there are.
 *
 * @throws AnalysisError `reading-outside-scale` where the transformation has no place for a reading, and as `analyze`
 */
export function analyzeAlternative(base: AnalysisInput, wish: AlternativeWish): Alternative {
  const { transform = { kind: 'none' }, error = 'ladder', refuseHierarchy = false } = wish;
  const asked = [...new Set(wish.terms)].sort(compareTerms);
  const terms = refuseHierarchy ? asked : completeHierarchy(asked);
  const { errorPlan: _, ...kept } = base;
  const blocks = wish.stretches && blocksOf(base, wish.stretches);
  const left = new Set(wish.without ?? []);
  const outside: number[] = [];
  const runs = base.runs.map((run, place) => {
    const block = blocks?.[place];
    const inBlock = block === undefined ? run : { ...run, block };
    if (left.has(place)) return { ...inBlock, y: null };
    if (transform.kind === 'none' || run.y === null) return inBlock;
    // A count is a share of its lot before anything else is done with it.
    const figure = base.scale === 'freeman-tukey' ? run.y / (run.n ?? 1) : run.y;
    const y = transformFigure(transform, figure);
    if (y === null) outside.push(place);
    // Parts are on the old scale: their spread says nothing about the new one.
    const { parts: _parts, n: _n, ...bare } = inBlock;
    return { ...bare, y };
  });
  if (outside.length > 0) throw new AnalysisError('reading-outside-scale', outside);
  const input: AnalysisInput = {
    ...kept,
    runs,
    terms,
    error,
    ...(transform.kind === 'none' ? {} : { scale: 'raw' }),
  };
  return {
    input,
    analysis: analyze(input),
    added: terms.filter((term) => !asked.includes(term)),
  };
}

/** A number for each block of the plan and stretch within it. */
function blocksOf({ runs }: AnalysisInput, stretches: readonly string[]): number[] {
  const names = runs.map((run, place) => `${run.block ?? 1} ${stretches[place] ?? ''}`);
  const different = [...new Set(names)];
  return names.map((name) => different.indexOf(name) + 1);
}
