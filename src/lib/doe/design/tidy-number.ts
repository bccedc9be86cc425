/** A number without the dust of binary fractions: 0.9, not 0.9000000000000001. */
export function tidyNumber(value: number): number {
  return Number(value.toPrecision(12));
}
