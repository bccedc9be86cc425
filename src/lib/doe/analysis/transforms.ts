/** Another scale for the readings of a run, chosen by whoever looks for a better model. */
export type Transform =
  | { kind: 'none' }
  | { kind: 'log' }
  | { kind: 'sqrt' }
  /** Of a share between 0 and 1: the angle whose sine is its root (Bartlett 1936, JRSS Suppl. 3, 68-78). */
  | { kind: 'arcsine' }
  /** (y^lambda - 1) / lambda, the logarithm at 0 (Box & Cox 1964, JRSS B 26, 211-252). */
  | { kind: 'boxCox'; lambda: number };

/** A figure on the new scale; null where it has no place there, as zero has none among logarithms. */
export function transformFigure(transform: Transform, y: number): number | null {
  switch (transform.kind) {
    case 'none':
      return y;
    case 'log':
      return y > 0 ? Math.log(y) : null;
    case 'sqrt':
      return y >= 0 ? Math.sqrt(y) : null;
    case 'arcsine':
      return y >= 0 && y <= 1 ? Math.asin(Math.sqrt(y)) : null;
    case 'boxCox':
      if (!(y > 0)) return null;
      return Math.abs(transform.lambda) < 1e-9
        ? Math.log(y)
        : Math.expm1(transform.lambda * Math.log(y)) / transform.lambda;
  }
}

/** The way back, for predictions; the nearest figure that exists where the scale ends before. */
export function figureBehind(transform: Transform, value: number): number {
  switch (transform.kind) {
    case 'none':
      return value;
    case 'log':
      return Math.exp(value);
    case 'sqrt':
      return Math.max(0, value) ** 2;
    case 'arcsine':
      return Math.sin(Math.min(Math.PI / 2, Math.max(0, value))) ** 2;
    case 'boxCox': {
      if (Math.abs(transform.lambda) < 1e-9) return Math.exp(value);
      return Math.max(0, 1 + transform.lambda * value) ** (1 / transform.lambda);
    }
  }
}
