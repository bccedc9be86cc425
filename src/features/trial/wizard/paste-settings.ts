import type { SettingAnswer } from '../answers.schema.ts';
import { parseFigure } from '../finished/typed-figure.ts';

type Pasted = SettingAnswer extends infer Each
  ? Each extends { id: string }
    ? Omit<Each, 'id'>
    : never
  : never;

function isFigure(cell: string | undefined): boolean {
  return parseFigure(cell ?? '') !== null;
}

function toSetting([name = '', low = '', high = '', usual = '', unit = '']: string[]): Pasted {
  if (isFigure(low) || isFigure(high)) return { kind: 'number', name, low, high, usual, unit };
  const now = usual === low ? 'low' : usual === high ? 'high' : undefined;
  return { kind: 'choice', name, low, high, usual: now };
}

/**
 * Settings from rows of a spreadsheet: name, low, high, now, unit; a row whose ends are no figures is an A-or-B by its two names.
 * A first row without a figure above rows with figures is taken for the headings.
 * @returns empty when no row has a name and two ends
 */
export function readPastedSettings(text: string): Pasted[] {
  const rows = text
    .split(/\r?\n/)
    .map((line) => line.split(line.includes('\t') ? '\t' : ';').map((cell) => cell.trim()))
    .filter(([name, low, high]) => name && low && high);
  const [first, ...rest] = rows;
  const hasFigure = (row: string[]) => row.slice(1).some(isFigure);
  const isHeading = first !== undefined && !hasFigure(first) && rest.some(hasFigure);
  return (isHeading ? rest : rows).map(toSetting);
}
