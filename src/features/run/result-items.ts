import type { Brief, ResponseSpec } from '../../lib/doe/index.ts';
import type { Figure } from './run.ts';

/** What is asked of each run for one result. */
export interface ResultItem {
  /** 0 is the main result, 1 to 3 those that are watched. */
  result: number;
  name: string;
  unit: string;
  kind: ResponseSpec['kind'];
  /** Figures wanted of one run. */
  parts: number;
  /** Parts to look at, for rejects and flaws. */
  lot: number | null;
  /** Smallest step of the gauge; null where nobody said. */
  step: number | null;
}

function toItem(spec: ResponseSpec, result: number): ResultItem {
  const isMeasured = spec.kind === 'measured';
  return {
    result,
    name: spec.name,
    unit: spec.unit,
    kind: spec.kind,
    parts: isMeasured ? (spec.partsPerRun ?? 1) : 1,
    lot: isMeasured ? null : (spec.lotSize ?? null),
    step: spec.resolution ?? null,
  };
}

/** The results that a run is asked for, main result first. */
export function listResultItems(brief: Pick<Brief, 'response' | 'watch'>): ResultItem[] {
  return [brief.response, ...brief.watch].map(toItem);
}

const holdsFigure = ({ value, rejects }: Figure) => value !== null || rejects !== null;

/** How many figures each result still lacks; nothing where all are in. */
export function missingParts(
  items: readonly ResultItem[],
  figures: readonly Figure[],
): { result: number; missing: number }[] {
  return items.flatMap(({ result, parts }) => {
    const known = new Set(
      figures.filter((each) => each.result === result && holdsFigure(each)).map(({ part }) => part),
    );
    return known.size >= parts ? [] : [{ result, missing: parts - known.size }];
  });
}

/** What is wrong with a figure for its result, as the code of a field problem; null: nothing. */
export function faultOfFigure(items: readonly ResultItem[], figure: Figure): string | null {
  const item = items[figure.result];
  if (!item || figure.part < 1 || figure.part > item.parts) return 'not-a-choice';
  if (item.kind === 'measured') return figure.value === null ? 'missing' : null;
  const count = item.kind === 'rejects' ? figure.rejects : figure.value;
  if (count === null) return 'missing';
  if (!Number.isInteger(count) || count < 0) return 'not-whole';
  const lot = figure.lot ?? item.lot;
  if (item.kind === 'rejects' && lot !== null && count > lot) return 'off-scale';
  return figure.lot !== null && figure.lot < 1 ? 'not-above-zero' : null;
}

/** A count is kept with the lot that it was counted in. */
export function completeFigure(items: readonly ResultItem[], figure: Figure): Figure {
  const item = items[figure.result];
  if (!item || item.kind === 'measured') return { ...figure, rejects: null, lot: null };
  const lot = figure.lot ?? item.lot;
  return item.kind === 'rejects' ? { ...figure, value: null, lot } : { ...figure, rejects: null, lot };
}
