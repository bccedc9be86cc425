import type { TagSetting } from '../../../components/ui/JobTag.tsx';
import type { SettingMarkKind } from '../../../components/ui/SettingMark.tsx';
import type { TagState } from '../../../components/ui/tag-state.ts';
import type { Formats } from '../../../i18n/format.ts';
import type { Board, BoardRun, BoardSetting } from '../board.schema.ts';
import type { ResultItem } from '../result-items.ts';

/** Enough for any gauge of a shop floor; nothing is rounded that was typed. */
const digits = 6;

/** The run whose turn it is: in hand, else the first that waits. */
export function findCurrent(runs: readonly BoardRun[]): BoardRun | undefined {
  return runs.find(({ state }) => state === 'asked') ?? runs.find(({ state }) => state === 'waiting');
}

/** How far a run is, as its tag shows it. */
export function tagStateOf(board: Board, run: BoardRun): TagState {
  switch (run.state) {
    case 'done':
    case 'skipped':
      return run.state;
    case 'doubtful':
      return 'askBack';
    case 'made':
      return 'waiting';
    case 'asked':
      return 'making';
    default:
      if (board.state === 'held' || board.state === 'paused') return 'held';
      return board.runs.find(({ state }) => state === 'waiting')?.id === run.id ? 'next' : 'planned';
  }
}

function markOf(setting: BoardSetting, value: number | string, coded: number): SettingMarkKind | undefined {
  if (setting.kind === 'choice') return value === setting.high ? 'second' : 'first';
  if (value === setting.low) return 'low';
  if (value === setting.high) return 'high';
  return coded === 0 ? 'middle' : undefined;
}

/** What a run is set to, as the panel takes it. */
export function tagSettings(
  board: Pick<Board, 'settings'>,
  run: Pick<BoardRun, 'planned' | 'actual' | 'coded'>,
  formats: Pick<Formats, 'number'>,
): TagSetting[] {
  return board.settings.map((setting, place) => {
    const planned = run.planned[place] ?? '';
    const value = run.actual?.[place] ?? planned;
    return {
      name: setting.name,
      value: typeof value === 'number' ? formats.number(value, digits) : value,
      unit: setting.unit === '' ? undefined : setting.unit,
      // A value that was found rather than planned stands between the levels.
      mark: value === planned ? markOf(setting, value, run.coded[place] ?? 0) : markOf(setting, value, 1),
    };
  });
}

/** One figure as it was read: a value, or bad ones. */
export function writeFigure(
  figure: { value: number | null; rejects: number | null },
  formats: Pick<Formats, 'number'>,
): string {
  const read = figure.rejects ?? figure.value;
  return read === null ? '' : formats.number(read, digits);
}

/** The figures of one result in a row, with their unit. */
export function writeFigures(
  run: Pick<BoardRun, 'figures'>,
  item: ResultItem,
  formats: Pick<Formats, 'number'>,
): string {
  const read = run.figures.filter(({ result }) => result === item.result);
  if (read.length === 0) return '';
  const figures = read.map((figure) => writeFigure(figure, formats)).join('  ');
  return item.unit === '' ? figures : `${figures} ${item.unit}`;
}

export function isOpenRun({ state }: Pick<BoardRun, 'state'>): boolean {
  return state !== 'done' && state !== 'skipped';
}

/** What to set back to when a trial ends or stops. */
export function usualLine(board: Pick<Board, 'settings'>, formats: Pick<Formats, 'number'>): string {
  return board.settings
    .map(({ name, usual, unit }) => {
      const value = typeof usual === 'number' ? formats.number(usual, digits) : usual;
      return unit === '' ? `${name} ${value}` : `${name} ${value} ${unit}`;
    })
    .join(', ');
}
