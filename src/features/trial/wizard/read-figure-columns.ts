import { parseFigure } from '../finished/typed-figure.ts';

/** No shop's file of past numbers is longer; what is would only hold up the page. */
const mostBytes = 2_000_000;

/** The column of a table that holds the most figures; the one further right of two alike, as a row begins with a date or a number. */
export function pickFigureColumn(rows: readonly (readonly string[])[]): string[] {
  const columns = new Map<number, string[]>();
  for (const row of rows) {
    row.forEach((cell, place) => {
      const text = cell.trim();
      if (parseFigure(text) !== null) columns.set(place, [...(columns.get(place) ?? []), text]);
    });
  }
  const [best = []] = [...columns]
    .sort(([left, one], [right, other]) => other.length - one.length || right - left)
    .map(([, figures]) => figures);
  return best;
}

/**
 * The past numbers in a file of rows, as they were written.
 * @throws RangeError when it is far too long; whatever the browser says when it cannot be read
 */
export async function readFigureColumns(file: File): Promise<string[]> {
  if (file.size > mostBytes) throw new RangeError('readFigureColumns: file is too long');
  // Few need it, so it is fetched with the first file.
  const [text, { default: papaparse }] = await Promise.all([file.text(), import('papaparse')]);
  const { data } = papaparse.parse<string[]>(text.trim(), { skipEmptyLines: true });
  return pickFigureColumn(data);
}
