/** One 0/1 column for each different key, in order of first appearance: together they say which rows belong together. */
export function indicatorColumns(keys: readonly (string | number | undefined)[]): number[][] {
  return [...new Set(keys)].map((key) => keys.map((other) => (other === key ? 1 : 0)));
}
