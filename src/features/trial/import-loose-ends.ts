import type { FieldProblem } from '../../i18n/field-codes.ts';
import type { TrialFile } from '../audit/pack/trial-file.schema.ts';
import type { ReadingInFile, RunInFile } from '../audit/pack/trial-file-runs.schema.ts';

type Place = readonly (string | number)[];

function fault(code: string, ...path: Place): FieldProblem {
  return { pointer: `#/${path.join('/')}`, code };
}

/** Each item after the first with the same key. */
function twice<Item>(
  items: readonly Item[],
  keyOf: (item: Item) => string | number | null,
  placeOf: (index: number) => Place,
): FieldProblem[] {
  const seen = new Set<string | number>();
  return items.flatMap((item, index) => {
    const key = keyOf(item);
    if (key === null) return [];
    if (seen.has(key)) return [fault('twice', ...placeOf(index))];
    seen.add(key);
    return [];
  });
}

function findReadingFaults(run: RunInFile, at: Place, results: number): FieldProblem[] {
  const placeOf = (index: number, field: string): Place => [...at, 'readings', index, field];
  const keyOf = ({ state, result, part }: ReadingInFile) => (state === 'counts' ? `${result} ${part}` : null);
  return [
    ...twice(run.readings, keyOf, (index) => placeOf(index, 'part')),
    ...run.readings.flatMap((reading, index) => {
      const older = reading.replaces === null ? undefined : run.readings[reading.replaces];
      const isOlder = reading.replaces === null || (older !== undefined && reading.replaces < index);
      return [
        ...(isOlder ? [] : [fault('points-nowhere', ...placeOf(index, 'replaces'))]),
        ...(reading.result < results ? [] : [fault('points-nowhere', ...placeOf(index, 'result'))]),
        ...(reading.value === null && reading.rejects === null
          ? [fault('missing', ...placeOf(index, 'value'))]
          : []),
      ];
    }),
  ];
}

function findRunFaults(file: TrialFile): FieldProblem[] {
  const plans = new Map(file.plans.map((plan) => [plan.n, plan]));
  const stretches = new Set(file.stretches.map(({ n }) => n));
  const numbers = new Set(file.runs.map(({ number }) => number));
  return file.runs.flatMap((run, index) => {
    const at = (field: string) => ['runs', index, field];
    const plan = plans.get(run.plan);
    if (!plan) return [fault('points-nowhere', ...at('plan'))];
    const settings = plan.brief.factors.length;
    const lists = ['coded', 'planned', 'actual'] as const;
    return [
      ...lists
        .filter((list) => run[list] !== null && run[list]?.length !== settings)
        .map((list) => fault('one-each', ...at(list))),
      ...(run.stretch === null || stretches.has(run.stretch)
        ? []
        : [fault('points-nowhere', ...at('stretch'))]),
      ...(run.repeats === null || (numbers.has(run.repeats) && run.repeats < run.number)
        ? []
        : [fault('points-nowhere', ...at('repeats'))]),
      ...findReadingFaults(run, ['runs', index], 1 + plan.brief.watch.length),
    ];
  });
}

function findPlanFaults({ plans }: TrialFile): FieldProblem[] {
  return plans.flatMap(({ brief, settingIds, proposal }, index) => {
    const settings = brief.factors.length;
    return [
      ...(settingIds.length === settings ? [] : [fault('one-each', 'plans', index, 'settingIds')]),
      ...brief.factors.flatMap((factor, place) =>
        factor.kind === 'choice' || factor.low < factor.high
          ? []
          : [fault('low-not-below-high', 'plans', index, 'brief', 'factors', place, 'low')],
      ),
      ...proposal.layout.flatMap(({ x }, row) =>
        x.length === settings ? [] : [fault('one-each', 'plans', index, 'proposal', 'layout', row, 'x')],
      ),
    ];
  });
}

/** Runs, stretches and verdicts come with the start of a trial, and every started trial has its plan and its runs. */
function findStateFaults({ trial, plans, runs, stretches, verdicts }: TrialFile): FieldProblem[] {
  const isPlanned = trial.state === 'ready' || trial.state === 'plan review' || trial.state === 'draft';
  const later = { runs, stretches, verdicts };
  if (isPlanned) {
    return Object.entries(later).flatMap(([part, list]) =>
      list.length === 0 ? [] : [fault('does-not-fit', part)],
    );
  }
  const hasMain = plans.some(({ phase }) => phase === 'main');
  return [
    ...(hasMain ? [] : [fault('missing', 'plans')]),
    ...(runs.length > 0 ? [] : [fault('missing', 'runs')]),
  ];
}

/** What each part of a trial file says rightly by itself but not together with the others, each by its place. */
export function findLooseEnds(file: TrialFile): FieldProblem[] {
  const verdicts = new Set(file.verdicts.map((verdict) => verdict.n));
  const counted = ['plans', 'stretches', 'verdicts', 'decisions'] as const;
  return [
    ...counted.flatMap((part) =>
      twice<{ n: number }>(
        file[part],
        ({ n }) => n,
        (index) => [part, index, 'n'],
      ),
    ),
    ...twice(
      file.verdicts,
      ({ inputHash, coreVersion }) => `${coreVersion} ${inputHash}`,
      (index) => ['verdicts', index, 'inputHash'],
    ),
    ...twice(
      file.runs,
      ({ number }) => number,
      (index) => ['runs', index, 'number'],
    ),
    ...findStateFaults(file),
    ...findPlanFaults(file),
    ...findRunFaults(file),
    ...file.decisions.flatMap(({ verdict }, index) =>
      verdicts.has(verdict) ? [] : [fault('points-nowhere', 'decisions', index, 'verdict')],
    ),
  ];
}
