/** Rows with the same key together, groups and rows in order of first appearance. */
export function groupBy<Row, Key>(rows: readonly Row[], keyOf: (row: Row) => Key): Row[][] {
  const groups = new Map<Key, Row[]>();
  for (const row of rows) {
    const group = groups.get(keyOf(row));
    if (group) group.push(row);
    else groups.set(keyOf(row), [row]);
  }
  return [...groups.values()];
}
