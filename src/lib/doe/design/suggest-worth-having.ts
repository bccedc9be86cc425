/** Rounded sizes within one power of ten, as people name them. */
const namedSizes = [1, 1.5, 2, 2.5, 3, 4, 5, 6, 8, 10] as const;
/** In standard deviations: hard to see, usual, easy to see. */
const multiples = [1, 1.5, 2.5] as const;

/**
 * Three differences a crew may find worth having, from the ups and downs of a single figure, rounded to sizes that people name and all different.
 *
 * @param sd standard deviation of the result, in its unit
 * @throws RangeError when it is not a positive number
 */
export function suggestWorthHaving(sd: number): [number, number, number] {
  if (!(sd > 0) || !Number.isFinite(sd))
    throw new RangeError(`suggestWorthHaving: sd must be positive, not ${sd}`);
  const [hard, usual, easy] = multiples.map((multiple) => roundToNamed(multiple * sd));
  return [hard ?? sd, usual ?? sd, easy ?? sd];
}

function roundToNamed(size: number): number {
  const power = 10 ** Math.floor(Math.log10(size));
  const nearest = namedSizes.reduce((best, named) =>
    Math.abs(named * power - size) < Math.abs(best * power - size) ? named : best,
  );
  // Through text, because 3 * 0.1 is not 0.3.
  return Number((nearest * power).toPrecision(2));
}
