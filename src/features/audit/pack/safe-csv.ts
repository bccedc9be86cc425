import Papa from 'papaparse';

export type CsvCell = string | number | boolean | null;

const byteOrderMark = '\uFEFF';

/**
 * A table for spreadsheets and programs alike. Words that a spreadsheet would take for a formula get an apostrophe in front;
 * numbers stay the numbers they are, the negative ones too.
 */
export function writeSafeCsv(rows: readonly (readonly CsvCell[])[]): string {
  const text = Papa.unparse(
    rows.map((row) => row.map((cell) => (typeof cell === 'boolean' ? String(cell) : cell))),
    { escapeFormulae: true, newline: '\r\n' },
  );
  return `${byteOrderMark}${text}\r\n`;
}
