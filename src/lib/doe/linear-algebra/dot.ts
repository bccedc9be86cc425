/** Sum of products. */
export function dot(first: readonly number[], second: readonly number[]): number {
  let sum = 0;
  for (let index = 0; index < first.length; index++) sum += (first[index] ?? 0) * (second[index] ?? 0);
  return sum;
}
