/** Finer steps than this say nothing more. */
const FINEST = -12;

/**
 * The step to which a figure is rounded, a power of ten, by how far it may be off: rough for a sentence ("about 41 N"), fine for a row where figures
 * are compared. Without a spread, two figures of the value itself.
 */
export function roundingStep(value: number, halfWidth: number | null, manner: 'rough' | 'fine'): number {
  const size = halfWidth !== null && halfWidth > 0 ? halfWidth / (manner === 'fine' ? 5 : 1) : 0;
  // A value of zero with no spread has no size; whole numbers will do.
  const exponent =
    size > 0 ? Math.floor(Math.log10(size)) : value === 0 ? 0 : Math.floor(Math.log10(Math.abs(value))) - 1;
  return 10 ** Math.max(FINEST, exponent);
}

/** A figure at a step, with the decimals that the step needs. */
export function roundTo(value: number, step: number): { value: number; digits: number } {
  const digits = Math.max(0, Math.round(-Math.log10(step)));
  const steps = Math.round(value / step);
  // A step below one is divided by, for 3 × 0.1 is not 0.3; zero is never negative.
  return { value: (step < 1 ? steps / 10 ** digits : steps * step) + 0, digits };
}

/** The step made fine enough that none of these figures, which are not zero, reads as zero; at most a hundredth of what it was. */
export function stepThatShows(values: readonly number[], step: number): number {
  for (const finer of [step, step / 10]) {
    if (values.every((value) => value === 0 || Math.round(value / finer) !== 0)) return finer;
  }
  return step / 100;
}
