/**
 * Splits rows into parts of (nearly) equal size so that no column leans towards one part: starting from turns, two rows change places as long as that
 * lowers the sum of squared leanings. Returns the part of each row, from 0.
 *
 * For plans without the symmetry that would give such a split by words.
 */
export function splitEvenly(columns: readonly (readonly number[])[], rows: number, parts: number): number[] {
  const part = Array.from({ length: rows }, (_, row) => row % parts);
  for (let pass = 0; pass < 20; pass++) {
    let improved = false;
    for (let first = 0; first < rows; first++) {
      for (let second = first + 1; second < rows; second++) {
        if (part[first] === part[second]) continue;
        const before = measureLeaning(columns, part, parts);
        exchange(part, first, second);
        if (measureLeaning(columns, part, parts) < before - 1e-9) improved = true;
        else exchange(part, first, second);
      }
    }
    if (!improved) break;
  }
  return part;
}

function exchange(part: number[], first: number, second: number): void {
  const kept = part[first] ?? 0;
  part[first] = part[second] ?? 0;
  part[second] = kept;
}

function measureLeaning(
  columns: readonly (readonly number[])[],
  part: readonly number[],
  parts: number,
): number {
  let leaning = 0;
  const sums = new Array<number>(parts);
  for (const column of columns) {
    sums.fill(0);
    column.forEach((value, row) => {
      const home = part[row] ?? 0;
      sums[home] = (sums[home] ?? 0) + value;
    });
    for (const sum of sums) leaning += sum * sum;
  }
  return leaning;
}
