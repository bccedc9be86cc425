/** Share of a column's length that must be left after projection for the column to count as new: far above rounding, far below any real setting. */
const RELATIVE_TOLERANCE = 1e-9;

/** A growing set of independent columns that knows what it already spans. */
export interface ColumnSpace {
  readonly rank: number;
  /** Adds the column if it is independent of those before it; says whether it was. */
  add(column: ArrayLike<number>): boolean;
  spans(column: ArrayLike<number>): boolean;
  /** Sum of squares of what the space leaves of a vector. */
  squaredDistance(vector: ArrayLike<number>): number;
}

/**
 * Column space of a model matrix, built one column at a time by Gram-Schmidt; where projection has taken most of a column it is done
 * twice, which is enough for orthogonality to rounding (Giraud, Langou & Rozloznik 2005, Computers and Mathematics with Applications 50).
 *
 * Rank is decided by relative tolerance: a column is dependent when less than 1e-9 of its own length is left.
 */
export function createColumnSpace(start: Iterable<ArrayLike<number>> = []): ColumnSpace {
  const basis: Float64Array[] = [];

  /** Takes the space out of `rest` in place; returns the length that is left and the length before. */
  const project = (rest: Float64Array): { left: number; whole: number } => {
    const whole = lengthOf(rest);
    let left = whole;
    for (let pass = 0; pass < 2; pass++) {
      for (const direction of basis) subtractProjection(rest, direction);
      const before = left;
      left = lengthOf(rest);
      if (left > 0.5 * before) break;
    }
    return { left, whole };
  };
  const isNew = ({ left, whole }: { left: number; whole: number }) =>
    whole > 0 && left > RELATIVE_TOLERANCE * whole;

  const space: ColumnSpace = {
    get rank() {
      return basis.length;
    },
    add(column) {
      if (basis.length >= column.length) return false;
      const rest = new Float64Array(column);
      const lengths = project(rest);
      if (!isNew(lengths)) return false;
      for (let row = 0; row < rest.length; row++) rest[row] = (rest[row] ?? 0) / lengths.left;
      basis.push(rest);
      return true;
    },
    spans: (column) => !isNew(project(new Float64Array(column))),
    squaredDistance: (vector) => project(new Float64Array(vector)).left ** 2,
  };
  for (const column of start) space.add(column);
  return space;
}

function lengthOf(vector: Float64Array): number {
  let squares = 0;
  for (let row = 0; row < vector.length; row++) squares += (vector[row] ?? 0) ** 2;
  return Math.sqrt(squares);
}

function subtractProjection(vector: Float64Array, direction: Float64Array): void {
  let product = 0;
  for (let row = 0; row < vector.length; row++) product += (vector[row] ?? 0) * (direction[row] ?? 0);
  if (product === 0) return;
  for (let row = 0; row < vector.length; row++)
    vector[row] = (vector[row] ?? 0) - product * (direction[row] ?? 0);
}
