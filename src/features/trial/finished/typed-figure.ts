import { parseTypedNumber } from '../../../i18n/format.ts';

const figureAndUnit = /^\p{Sc}?\s*([-+\u2212]?(?:\d+(?:[.,]\d+)?|[.,]\d+))\s*([\p{L}\p{Sc}°%µ/'"].*)?$/u;
/** Digits that belong to a unit: `m2`, `N/15 mm`, `N per 15 mm`. Any others make the text more than one figure. */
const digitsOfUnit = /(?:\/|\b(?:per|por|na|trên|mỗi))\s*\d+(?:[.,]\d+)?|(?<=\p{L})\d/giu;

/** A figure as people type it, with or without its unit behind it; null when the text is not one figure. */
export function parseFigure(text: string): number | null {
  const [, figure, unit = ''] = figureAndUnit.exec(text.trim()) ?? [];
  if (figure === undefined || /\d/.test(unit.replace(digitsOfUnit, ''))) return null;
  return parseTypedNumber(figure);
}

/**
 * Figures one below the other or side by side, as they come out of a spreadsheet or are typed with spaces between.
 * A comma stands for the decimal point where a space, a semicolon or a new line parts the figures.
 * @returns null when something in it is no figure
 */
export function parseFigures(text: string): number[] | null {
  const isListed = /[\s;]/.test(text.trim());
  const cells = text
    .split(isListed ? /[\s;]+/ : /,/)
    .map((cell) => (isListed ? cell.replace(/,$/, '') : cell).trim())
    .filter((cell) => cell !== '');
  const figures = cells.map(parseTypedNumber);
  return figures.every((figure) => figure !== null) ? figures : null;
}
