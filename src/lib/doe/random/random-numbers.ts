/** A source of random numbers: each call gives the next one, evenly spread over [0, 1). */
export type UniformSource = () => number;

/**
 * Reproducible random numbers from a seed: the same seed gives the same numbers on every machine.
 *
 * Small fast chaotic generator with 128 bits of state (sfc32, C. Doty-Humphrey, PractRand), 32 random bits a call; the first dozen
 * outputs are thrown away so that neighbouring seeds have nothing in common.
 *
 * @throws RangeError when the seed is not a finite number.
 */
export function createUniformSource(seed: number): UniformSource {
  if (!Number.isFinite(seed)) throw new RangeError(`createUniformSource: seed must be finite, got ${seed}`);
  let a = 0x9e3779b9 ^ Math.floor(seed / 0x1_0000_0000);
  let b = Math.floor(seed) >>> 0;
  let c = 0x243f6a88;
  let counter = 1;
  const next = () => {
    const sum = (((a + b) | 0) + counter) | 0;
    counter = (counter + 1) | 0;
    a = b ^ (b >>> 9);
    b = (c + (c << 3)) | 0;
    c = (c << 21) | (c >>> 11);
    c = (c + sum) | 0;
    return (sum >>> 0) / 0x1_0000_0000;
  };
  for (let warmUp = 0; warmUp < 15; warmUp++) next();
  return next;
}
