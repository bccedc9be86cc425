/** How many contrasts a promise on pseudo error assumes to be active, all of the same size: a quarter of them, two at least. */
export function assumeActive(contrasts: number): number {
  return Math.max(2, Math.round(contrasts / 4));
}
