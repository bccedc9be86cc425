import { parseTypedNumber } from '../../../i18n/format.ts';
import type { BoardRun } from '../board.schema.ts';
import type { ResultItem } from '../result-items.ts';
import type { FigureInput } from '../run-event.schema.ts';

/** A field of a run's readings: `0-1` is the first part of the main result. */
export interface FigureField {
  key: string;
  item: ResultItem;
  part: number;
}

export function listFigureFields(items: readonly ResultItem[]): FigureField[] {
  return items.flatMap((item) =>
    Array.from({ length: item.parts }, (_, place) => ({
      key: `${item.result}-${place + 1}`,
      item,
      part: place + 1,
    })),
  );
}

/** What was read so far, as it would be typed. */
export function typedFigures(run: Pick<BoardRun, 'figures'>): Record<string, string> {
  return Object.fromEntries(
    run.figures.map(({ result, part, value, rejects }) => [
      `${result}-${part}`,
      String(rejects ?? value ?? ''),
    ]),
  );
}

export interface ReadFigures {
  figures: FigureInput[];
  /** The code of what is wrong with a field, by its key. */
  faults: Record<string, string>;
}

/** Reads what was typed; fields that are empty, or as they were before, say nothing. */
export function readTypedFigures(
  fields: readonly FigureField[],
  typed: Readonly<Record<string, string>>,
  before: Readonly<Record<string, string>> = {},
): ReadFigures {
  const read: ReadFigures = { figures: [], faults: {} };
  for (const { key, item, part } of fields) {
    const text = (typed[key] ?? '').trim();
    if (text === '' || text === (before[key] ?? '').trim()) continue;
    const figure = parseTypedNumber(text);
    const place = { result: item.result, part };
    if (figure === null) read.faults[key] = 'not-a-number';
    else if (item.kind === 'measured') read.figures.push({ ...place, value: figure });
    else if (!Number.isInteger(figure) || figure < 0) read.faults[key] = 'not-whole';
    else if (item.kind === 'rejects') read.figures.push({ ...place, rejects: figure });
    else read.figures.push({ ...place, value: figure });
  }
  return read;
}

/**
 * Cells as they come out of a spreadsheet: rows by line, columns by tab.
 * @returns null for a single cell, which is an ordinary paste
 */
export function readPastedCells(text: string): string[][] | null {
  const rows = text
    .replace(/\r/g, '')
    .replace(/\n+$/, '')
    .split('\n')
    .map((row) => row.split('\t').map((cell) => cell.trim()));
  return rows.length > 1 || (rows[0]?.length ?? 0) > 1 ? rows : null;
}
