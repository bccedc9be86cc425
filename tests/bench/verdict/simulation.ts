import { createNormalSource } from '../../../src/lib/doe/random/normal-numbers.ts';
import { createUniformSource, type UniformSource } from '../../../src/lib/doe/random/random-numbers.ts';

/** Both kinds of random numbers from one seed. */
export interface RandomSource {
  uniform: UniformSource;
  normal: () => number;
}

export function createRandomSource(seed: number): RandomSource {
  const uniform = createUniformSource(seed);
  return { uniform, normal: createNormalSource(uniform) };
}

/** The items in random order (Fisher & Yates). */
export function shuffle<Item>(items: readonly Item[], { uniform }: RandomSource): Item[] {
  const mixed = [...items];
  for (let last = mixed.length - 1; last > 0; last--) {
    const place = Math.floor(uniform() * (last + 1));
    const held = mixed[last];
    const other = mixed[place];
    if (held === undefined || other === undefined) break;
    mixed[last] = other;
    mixed[place] = held;
  }
  return mixed;
}

/** A Markdown table. */
export function markdownTable(
  heads: readonly string[],
  rows: readonly (readonly (string | number)[])[],
): string {
  const line = (cells: readonly (string | number)[]) => `| ${cells.join(' | ')} |`;
  return [line(heads), line(heads.map(() => '---')), ...rows.map(line)].join('\n');
}

export function asShare(hits: number, of: number): string {
  return of === 0 ? '' : (hits / of).toFixed(4).replace(/^0/, '');
}
