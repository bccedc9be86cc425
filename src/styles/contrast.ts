/** A color as three sRGB channels, 0 to 255. */
export type Rgb = readonly [red: number, green: number, blue: number];

/** Reads `#rrggbb` or `#rrggbbaa`; an opacity is left out, because only the scrim has one and nothing is written on it. */
export function parseHex(hex: string): Rgb {
  const digits = /^#([0-9a-f]{2})([0-9a-f]{2})([0-9a-f]{2})(?:[0-9a-f]{2})?$/i.exec(hex);
  if (!digits) throw new RangeError(`parseHex: hex must be #rrggbb, not ${hex}`);
  const [, red = '', green = '', blue = ''] = digits;
  return [Number.parseInt(red, 16), Number.parseInt(green, 16), Number.parseInt(blue, 16)];
}

function linearize(channel: number): number {
  const part = channel / 255;
  return part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4;
}

/** Relative luminance, 0 (black) to 1 (white). Source: WCAG 2.2, "relative luminance". */
export function luminance([red, green, blue]: Rgb): number {
  return 0.2126 * linearize(red) + 0.7152 * linearize(green) + 0.0722 * linearize(blue);
}

/** Contrast ratio, 1 (same) to 21 (black on white). Source: WCAG 2.2, "contrast ratio". */
export function contrastRatio(one: string, other: string): number {
  const [dark = 0, light = 0] = [luminance(parseHex(one)), luminance(parseHex(other))].sort((a, b) => a - b);
  return (light + 0.05) / (dark + 0.05);
}

export interface TokenColors {
  readonly light: string;
  readonly dark: string;
}

/** Every `--color-<name>: light-dark(a, b)` of a style sheet, by name. */
export function readColorTokens(css: string): ReadonlyMap<string, TokenColors> {
  const found = css.matchAll(/--color-([a-z-]+):\s*light-dark\((#[0-9a-f]+),\s*(#[0-9a-f]+)\)/gi);
  return new Map(Array.from(found, ([, name = '', light = '', dark = '']) => [name, { light, dark }]));
}
