import { letterAt } from '../../../lib/doe/index.ts';
import type { CsvCell } from './safe-csv.ts';
import type { TrialFile } from './trial-file.schema.ts';
import type { ReadingInFile, RunInFile } from './trial-file-runs.schema.ts';

const before = [
  'run',
  'place',
  'phase',
  'plan',
  'block',
  'whole_plot',
  'group',
  'center',
  'warm_up',
  'repeats',
  'stretch',
  'run_state',
  'end',
  'made_at',
  'measured_at',
] as const;
const after = [
  'gauge',
  'label',
  'result',
  'part',
  'value',
  'rejects',
  'lot',
  'reading_state',
  'source',
  'reason',
  'taken_at',
] as const;

function moment(at: number | null): string | null {
  return at === null ? null : new Date(at).toISOString();
}

function cellsOfReading(reading: ReadingInFile | null): CsvCell[] {
  if (!reading) return Array.from({ length: after.length - 2 }, () => null);
  const { result, part, value, rejects, lot, state, source, reason, at } = reading;
  return [result, part, value, rejects, lot, state, source, reason, moment(at)];
}

/**
 * Every reading that was ever taken, in the order of running, one a row; a run without readings has a row of its own.
 * Headings are the same in every language, as programs read them; the names of settings stand in theirs.
 */
export function listReadingRows({ plans, runs }: TrialFile): CsvCell[][] {
  const phases = new Map(plans.map(({ n, phase }) => [n, phase]));
  const factors = plans.filter(({ phase }) => phase === 'main').at(-1)?.brief.factors ?? [];
  const settings = factors.flatMap(({ name }, place) => [
    `${letterAt(place)} planned: ${name}`,
    `${letterAt(place)} reached: ${name}`,
  ]);
  const cellsOfRun = (run: RunInFile): CsvCell[] => [
    run.number,
    run.place,
    phases.get(run.plan) ?? null,
    run.plan,
    run.block,
    run.wholePlot,
    run.group,
    run.center,
    run.warmUp,
    run.repeats,
    run.stretch,
    run.state,
    run.end,
    moment(run.madeAt),
    moment(run.measuredAt),
    ...factors.flatMap((_, place) => [run.planned[place] ?? null, run.actual?.[place] ?? null]),
    run.gauge,
    run.label,
  ];
  const inOrder = [...runs].sort((one, other) => one.place - other.place || one.number - other.number);
  return [
    [...before, ...settings, ...after],
    ...inOrder.flatMap((run) => {
      const readings = run.readings.length > 0 ? run.readings : [null];
      return readings.map((reading) => [...cellsOfRun(run), ...cellsOfReading(reading)]);
    }),
  ];
}
