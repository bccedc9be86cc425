/** A regular two-level plan in its smallest form: which settings are products of which others. */
export interface CatalogueEntry {
  k: number;
  runs: number;
  /** With a plus sign; any sign gives a plan just as good. */
  generators: readonly string[];
}

/**
 * Regular two-level plans for 1 to 7 settings in up to 32 runs: full factorials and the fractions of minimum aberration.
 *
 * Generators as in Box, Hunter & Hunter (1978), Table 12.15; the word-length patterns are those of Chen, Sun & Wu (1993), International Statistical
 * Review 61, 131-145. The tests prove by exhaustive search that none is better.
 */
export const catalogue: readonly CatalogueEntry[] = [
  { k: 1, runs: 2, generators: [] },
  { k: 2, runs: 4, generators: [] },
  { k: 3, runs: 4, generators: ['C=AB'] },
  { k: 3, runs: 8, generators: [] },
  { k: 4, runs: 8, generators: ['D=ABC'] },
  { k: 4, runs: 16, generators: [] },
  { k: 5, runs: 8, generators: ['D=AB', 'E=AC'] },
  { k: 5, runs: 16, generators: ['E=ABCD'] },
  { k: 5, runs: 32, generators: [] },
  { k: 6, runs: 8, generators: ['D=AB', 'E=AC', 'F=BC'] },
  { k: 6, runs: 16, generators: ['E=ABC', 'F=BCD'] },
  { k: 6, runs: 32, generators: ['F=ABCDE'] },
  { k: 7, runs: 8, generators: ['D=AB', 'E=AC', 'F=BC', 'G=ABC'] },
  { k: 7, runs: 16, generators: ['E=ABC', 'F=BCD', 'G=ACD'] },
  { k: 7, runs: 32, generators: ['F=ABCD', 'G=ABDE'] },
];
