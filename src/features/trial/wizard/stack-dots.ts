export interface StackedDot {
  figure: number;
  /** How many dots lie below it. */
  level: number;
  key: string;
}

/** Columns of the strip: figures of one column would cover each other. */
const columns = 56;

/** Readings in the order of their size, each with its place in the column it falls into. */
export function stackDots(
  figures: readonly number[],
  { from, to }: { from: number; to: number },
): StackedDot[] {
  const filled = new Map<number, number>();
  return [...figures]
    .sort((one, other) => one - other)
    .map((figure) => {
      const column = Math.floor(((figure - from) / (to - from)) * columns);
      const level = filled.get(column) ?? 0;
      filled.set(column, level + 1);
      return { figure, level, key: `${column}-${level}` };
    });
}
