import type { Ask, RunPrompt } from '../message/run-prompt.ts';
import type { Figure, Run } from './run.ts';
import type { RunItem, RunningTrial } from './running-trial.ts';

/** A number as machines and phones show it: with a point, no more digits than it has. */
export function writeFigure(value: number | string): string {
  return typeof value === 'string' ? value : String(Number(value.toPrecision(12)));
}

/** The settings of a run in the panel's words, as reached where that differs from the plan. */
export function settingsOfRun(trial: RunningTrial, run: Run): { name: string; value: number | string }[] {
  const values = run.actual ?? run.planned;
  return trial.settings.map(({ name }, place) => ({ name, value: values[place] ?? '' }));
}

/** `JAW TEMP 150, DWELL 0.8`: what the dials go back to. */
export function writeUsualSettings(trial: RunningTrial): string {
  return trial.settings.map(({ name, usual }) => `${name} ${writeFigure(usual)}`).join(', ');
}

/** What a text asks for, with an example of this result's size. */
export function askFor(item: RunItem): Ask {
  const { kind, name, readings: count, lotSize } = item;
  return {
    kind,
    name,
    count,
    ...(kind === 'rejects' && lotSize !== null ? { lot: lotSize } : {}),
    example: writeExample(item),
  };
}

/** Today's usual figure and its neighbours; never a round number that could be taken for a figure to send. */
function writeExample({ kind, readings, usual, lotSize }: RunItem): string {
  if (kind !== 'measured') return String(Math.min(3, lotSize ?? 3));
  const middle = usual ?? 41.5;
  const step = middle === 0 ? 0.1 : 10 ** (Math.floor(Math.log10(Math.abs(middle))) - 1);
  const decimals = Math.max(0, -Math.floor(Math.log10(step)));
  const places = [0, -1, 1, 2, -2, 3, -3];
  return Array.from({ length: readings }, (_, part) =>
    (middle + (places[part % places.length] ?? 0) * step).toFixed(Math.max(decimals, decimalsOf(middle))),
  ).join(' ');
}

function decimalsOf(value: number): number {
  return writeFigure(value).split('.')[1]?.length ?? 0;
}

/** The prompt of a run, without what stands above it. */
export function describePrompt(trial: RunningTrial, run: Run, runs: number): RunPrompt {
  const [main] = trial.items;
  if (!main) throw new RangeError('describePrompt: trial has no result');
  return {
    machine: trial.machine,
    run: run.number,
    runs,
    settings: settingsOfRun(trial, run).map(({ name, value }) => ({ name, value: writeFigure(value) })),
    wait: trial.settleMinutes,
    discard: trial.discardParts,
    make: trial.makeParts,
    label: run.label ?? trial.label,
    ask: askFor(main),
    later: trial.resultsLater,
    hazard: trial.hazard,
    ...(run.warmUp ? { warmUp: true } : {}),
  };
}

/** `41.5 40.8 42` or `3/50`: one result of a run as it was sent. */
export function writeValues(readings: readonly Pick<Figure, 'value' | 'rejects' | 'lot'>[]): string {
  return readings
    .map(({ value, rejects, lot }) => {
      if (value !== null) return writeFigure(value);
      return lot === null ? String(rejects ?? '') : `${rejects}/${lot}`;
    })
    .join(' ');
}
