/** All combinations of low (-1) and high (+1) of k settings, in standard order: the first setting changes fastest. */
export function listCorners(k: number): number[][] {
  return Array.from({ length: 2 ** k }, (_, run) =>
    Array.from({ length: k }, (__, index) => ((run >> index) & 1 ? 1 : -1)),
  );
}
