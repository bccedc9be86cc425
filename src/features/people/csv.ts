import Papa from 'papaparse';

/** One row of a file with the line it begins on, as an editor counts lines. */
export interface CsvRow {
  line: number;
  cells: string[];
  /** A quote was opened and never closed, or stands in the middle of a word. */
  quotesBroken: boolean;
}

const byteOrderMark = '\uFEFF';

function countLineBreaks(text: string, from: number, to: number): number {
  let breaks = 0;
  for (let place = from; place < to; place += 1) {
    const letter = text.charCodeAt(place);
    const isLineFeed = letter === 10;
    const isLoneReturn = letter === 13 && text.charCodeAt(place + 1) !== 10;
    if (isLineFeed || isLoneReturn) breaks += 1;
  }
  return breaks;
}

function isBlank(cells: readonly string[]): boolean {
  return cells.every((cell) => cell.trim() === '');
}

const separators = [';', '\t', ','] as const;

/** The separator that the first row with words has most of, outside quotes. */
function findSeparator(content: string): string {
  const firstLine = content.split(/[\r\n]/).find((line) => line.trim() !== '') ?? '';
  const bare = firstLine.replace(/"[^"]*"/g, '');
  const countOf = (separator: string) => bare.split(separator).length;
  return separators.reduce((best, other) => (countOf(other) > countOf(best) ? other : best));
}

/**
 * Reads a file of rows: commas, semicolons or tabs, any ends of lines, quoted cells, with or without a byte order mark.
 * Blank rows are left out.
 * @param limit.rows reading ends one row past this many, which is enough to know that there are too many
 */
export function readCsv(text: string, limit: { rows: number }): CsvRow[] {
  const content = text.startsWith(byteOrderMark) ? text.slice(1) : text;
  const rows: CsvRow[] = [];
  let line = 1;
  let cursor = 0;
  Papa.parse<string[]>(content, {
    delimiter: findSeparator(content),
    step({ data, errors, meta }, parser) {
      const quotesBroken = errors.some((error) => error.type === 'Quotes');
      if (!isBlank(data)) rows.push({ line, cells: data.map((cell) => cell.trim()), quotesBroken });
      line += countLineBreaks(content, cursor, meta.cursor);
      cursor = meta.cursor;
      if (rows.length > limit.rows) parser.abort();
    },
  });
  return rows;
}

/** How many rows a file has, without keeping them. */
export function countCsvRows(text: string): number {
  let count = 0;
  Papa.parse<string[]>(text, {
    delimiter: findSeparator(text),
    step({ data }) {
      if (!isBlank(data)) count += 1;
    },
  });
  return count;
}

const plainNegative = /^-\d+([.,]\d+)?$/;

/** A cell that a spreadsheet would compute gets an apostrophe in front; a plain negative number is left a number. */
function guardFormula(cell: string): string {
  return /^[=+\-@\t\r]/.test(cell) && !plainNegative.test(cell) ? `'${cell}` : cell;
}

/** Writes rows with commas and quotes where needed, so that no name becomes a formula. */
export function writeCsv(rows: readonly (readonly string[])[]): string {
  const text = Papa.unparse(
    rows.map((row) => row.map(guardFormula)),
    { newline: '\r\n' },
  );
  return `${byteOrderMark}${text}\r\n`;
}

/** Takes the apostrophe away again that `writeCsv` puts before what looks like a formula. */
export function withoutFormulaGuard(cell: string): string {
  return /^'[=+\-@\t\r]/.test(cell) ? cell.slice(1) : cell;
}
