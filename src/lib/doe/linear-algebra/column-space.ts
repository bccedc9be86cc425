/** Share of a column's length that must be left after projection for the column to count as new: far above rounding, far below any real setting. */
const RELATIVE_TOLERANCE = 1e-9;

/** A growing set of independent columns that knows what it already spans. */
export interface ColumnSpace {
  readonly rank: number;
  /** Adds the column if it is independent of those before it; says whether it was. */
  add(column: readonly number[]): boolean;
  spans(column: readonly number[]): boolean;
}

/**
 * Column space of a model matrix, built one column at a time by Gram-Schmidt with one re-orthogonalization, which is enough for
 * orthogonality to rounding (Giraud, Langou & Rozloznik 2005, Computers and Mathematics with Applications 50).
 *
 * Rank is decided by relative tolerance: a column is dependent when less than 1e-9 of its own length is left.
 */
export function createColumnSpace(start: Iterable<readonly number[]> = []): ColumnSpace {
  const basis: Float64Array[] = [];

  const remainder = (column: readonly number[]): { rest: Float64Array; isNew: boolean; length: number } => {
    const rest = Float64Array.from(column);
    const whole = lengthOf(rest);
    for (let pass = 0; pass < 2; pass++) for (const direction of basis) subtractProjection(rest, direction);
    const length = lengthOf(rest);
    return { rest, length, isNew: whole > 0 && length > RELATIVE_TOLERANCE * whole };
  };

  const space: ColumnSpace = {
    get rank() {
      return basis.length;
    },
    add(column) {
      if (basis.length >= column.length) return false;
      const { rest, length, isNew } = remainder(column);
      if (!isNew) return false;
      basis.push(rest.map((value) => value / length));
      return true;
    },
    spans: (column) => !remainder(column).isNew,
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
