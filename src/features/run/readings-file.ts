import { parseTypedNumber } from '../../i18n/format.ts';
import { foldWords } from '../../lib/messages/index.ts';
import { type CsvRow, withoutFormulaGuard } from '../people/csv.ts';
import type { ReadingFaultCode } from './readings-file.schema.ts';
import { faultOfFigure, type ResultItem } from './result-items.ts';
import { type Figure, isOpen, type Run } from './run.ts';

/** What a first row may call the column with the run's number, folded. */
const runWords = ['run', 'runs', 'corrida', 'corridas', 'przebieg', 'przebiegi', 'luot', 'luot chay'];

/** One figure that a file has a column for. */
interface FigureColumn {
  item: ResultItem;
  part: number;
}
export type Column = 'run' | FigureColumn | null;

/** `seal strength`, or `seal strength 2` where a run has several parts: the same in every language. */
export function figureHeading({ item, part }: FigureColumn): string {
  return item.parts > 1 ? `${item.name} ${part}` : item.name;
}

export function listFigureColumns(items: readonly ResultItem[]): FigureColumn[] {
  return items.flatMap((item) =>
    Array.from({ length: item.parts }, (_, place) => ({ item, part: place + 1 })),
  );
}

/** The columns that a first row names. @returns null where the run or every figure is missing */
export function readColumns(first: CsvRow, items: readonly ResultItem[]): Column[] | null {
  const figures = listFigureColumns(items);
  const columns = first.cells.map((cell): Column => {
    const heading = foldWords(withoutFormulaGuard(cell));
    if (runWords.includes(heading)) return 'run';
    return figures.find((figure) => foldWords(figureHeading(figure)) === heading) ?? null;
  });
  const isWhole = columns.includes('run') && columns.some((column) => column !== null && column !== 'run');
  return isWhole ? columns : null;
}

export interface FileRun {
  line: number;
  run: Run;
  figures: Figure[];
}
export interface FileFault {
  line: number;
  code: ReadingFaultCode;
  text: string;
}

const shownLetters = 40;
const faultCodes: ReadonlyMap<string, ReadingFaultCode> = new Map([
  ['not-whole', 'not-whole'],
  ['off-scale', 'off-scale'],
]);

/** Reads the rows under the headings as figures of open runs, or names what is wrong with each. */
export function readReadings(
  rows: readonly CsvRow[],
  columns: readonly Column[],
  about: { runs: readonly Run[]; items: readonly ResultItem[] },
): { runs: FileRun[]; faults: FileFault[] } {
  const faults: FileFault[] = [];
  const found: FileRun[] = [];
  for (const row of rows) {
    const refuse = (code: ReadingFaultCode, text: string): void => {
      faults.push({ line: row.line, code, text: text.slice(0, shownLetters) });
    };
    const before = faults.length;
    if (row.quotesBroken) refuse('quotes', row.cells.join(' '));
    const cell = withoutFormulaGuard(row.cells[columns.indexOf('run')] ?? '');
    const run = about.runs.find(({ number }) => String(number) === cell);
    if (!run) refuse('no-run', cell);
    else if (!isOpen(run)) refuse('closed-run', cell);
    else if (found.some((one) => one.run.id === run.id)) refuse('same-run', cell);
    const figures = readFigures(row, columns, about.items, refuse);
    if (figures.length === 0 && faults.length === before) refuse('no-figure', cell);
    if (run && faults.length === before) found.push({ line: row.line, run, figures });
  }
  return { runs: found, faults };
}

function readFigures(
  row: CsvRow,
  columns: readonly Column[],
  items: readonly ResultItem[],
  refuse: (code: ReadingFaultCode, text: string) => void,
): Figure[] {
  return columns.flatMap((column, place): Figure[] => {
    const text = withoutFormulaGuard(row.cells[place] ?? '');
    if (column === null || column === 'run' || text === '') return [];
    const { item, part } = column;
    const read = parseTypedNumber(text);
    if (read === null) {
      refuse('not-a-number', text);
      return [];
    }
    const isRejects = item.kind === 'rejects';
    const { result, lot } = item;
    const figure = { result, part, value: isRejects ? null : read, rejects: isRejects ? read : null, lot };
    const fault = faultOfFigure(items, figure);
    if (fault !== null) refuse(faultCodes.get(fault) ?? 'not-a-number', text);
    return fault === null ? [figure] : [];
  });
}
