import { dot } from '../linear-algebra/dot.ts';

export interface NuisanceSpace {
  rank: number;
  projectOut(column: readonly number[]): number[];
  /** The constant as a weighted sum of readings, and its variance for noise 1. */
  constant: { row: number[]; variance: number };
  leverage(row: number): number;
}

/** The fixed columns, of which nothing is known beforehand. */
export function nuisanceSpace(columns: readonly (readonly number[])[]): NuisanceSpace {
  const [first = [], ...others] = columns;
  const basis: number[][] = [];
  const projectOut = (column: readonly number[]): number[] => {
    const rest = [...column];
    for (const direction of basis) {
      const product = dot(rest, direction);
      for (let row = 0; row < rest.length; row++)
        rest[row] = (rest[row] ?? 0) - product * (direction[row] ?? 0);
    }
    return rest;
  };
  // The constant comes last, so that what the others leave of it is what tells its level.
  for (const column of [...others, first]) {
    const rest = projectOut(projectOut(column));
    const length = Math.sqrt(dot(rest, rest));
    if (length > 1e-9 * Math.sqrt(dot(column, column))) basis.push(rest.map((value) => value / length));
  }
  const last = basis.at(-1) ?? [];
  const length = dot(last, first);
  return {
    rank: basis.length,
    projectOut,
    constant: { row: last.map((value) => value / length), variance: 1 / (length * length) },
    leverage: (row) => basis.reduce((sum, direction) => sum + (direction[row] ?? 0) ** 2, 0),
  };
}
