/** A cell as the page shows it and as it is exactly. */
export interface CellText {
  words: string;
  /** null where it holds no figure. */
  figure: number | null;
  /** What is copied in place of the words: all digits of a figure, a moment in full; null: the words. */
  exact: string | null;
}

/** The order of the rows: figures by size, words by the alphabet; what is empty stays at the end either way. */
export function sortPlaces(cells: readonly CellText[], direction: 'ascending' | 'descending'): number[] {
  const turn = direction === 'ascending' ? 1 : -1;
  const isEmpty = ({ words, figure }: CellText) => figure === null && (words === '' || words === '\u2013');
  const compare = (one: CellText, other: CellText): number => {
    if (isEmpty(one) || isEmpty(other)) return Number(isEmpty(one)) - Number(isEmpty(other));
    if (one.figure !== null && other.figure !== null) return turn * (one.figure - other.figure);
    const collated = one.exact && other.exact ? one.exact.localeCompare(other.exact) : 0;
    return turn * (collated || one.words.localeCompare(other.words, undefined, { numeric: true }));
  };
  return cells
    .map((cell, place) => ({ cell, place }))
    .sort((one, other) => compare(one.cell, other.cell) || one.place - other.place)
    .map(({ place }) => place);
}

/** A cell's text must not begin a formula in the spreadsheet, nor break out of its cell. */
function safeText(words: string): string {
  const flat = words.replace(/\s+/g, ' ').trim();
  return /^[=+@\-\t\r]/.test(flat) && !/^[-+]?[\d.,]+$/.test(flat) ? `'${flat}` : flat;
}

/** Lines of cells parted by tabs, figures with every digit and the reader's decimal mark. */
export function toTabs(
  header: readonly string[],
  rows: readonly (readonly CellText[])[],
  decimalMark: string,
): string {
  const write = ({ words, figure, exact }: CellText) => {
    if (figure !== null && exact !== null) return exact.replace('.', decimalMark);
    if (exact === '') return '';
    return safeText(exact ?? words);
  };
  return [header.map(safeText), ...rows.map((row) => row.map(write))]
    .map((cells) => cells.join('\t'))
    .join('\n');
}
