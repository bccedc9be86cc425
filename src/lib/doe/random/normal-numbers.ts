import type { UniformSource } from './random-numbers.ts';

/** Independent standard normal numbers by the polar method (G. Marsaglia & T.A. Bray, 1964, SIAM Review 6). */
export function createNormalSource(uniform: UniformSource): () => number {
  let spare: number | undefined;
  return () => {
    if (spare !== undefined) {
      const value = spare;
      spare = undefined;
      return value;
    }
    for (;;) {
      const u = 2 * uniform() - 1;
      const v = 2 * uniform() - 1;
      const square = u * u + v * v;
      if (square >= 1 || square === 0) continue;
      const scale = Math.sqrt((-2 * Math.log(square)) / square);
      spare = v * scale;
      return u * scale;
    }
  };
}
