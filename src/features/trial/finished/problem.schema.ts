import { z } from 'zod';
import { measuringTimes, resultKinds, starterNames, wishes } from '../answer-choices.ts';
import { figure, line, neededLine, point } from './typed-fields.ts';

export const scoreRange = { least: 0, most: 10 } as const;

export const jobFinished = z.strictObject({
  starter: z.enum(starterNames).optional(),
  /** Empty: named after the machine and the result. */
  title: line,
  machine: neededLine,
});

export const resultFinishedFields = {
  name: neededLine,
  unit: line,
  wish: z.enum(wishes),
  target: figure(),
  kind: z.enum(resultKinds),
  lotSize: figure({ atLeast: 2, atMost: 100_000, whole: true }),
};

interface FinishedResult {
  unit: string;
  wish: (typeof wishes)[number];
  target: number | null;
  kind: (typeof resultKinds)[number];
  lotSize: number | null;
}

/** What must be said besides, by what was chosen. */
export function checkResult(
  result: FinishedResult,
  context: z.RefinementCtx,
  path: PropertyKey[] = [],
): void {
  const { kind, target } = result;
  if (kind === 'measured' && result.unit === '') point(context, [...path, 'unit'], 'missing');
  if (kind === 'rejects' && result.lotSize === null) point(context, [...path, 'lotSize'], 'missing');
  if (result.wish !== 'target') return;
  if (target === null) point(context, [...path, 'target'], 'missing');
  else if (!fitsScale(target, result)) point(context, [...path, 'target'], 'off-scale');
}

/** Whether a figure can be one of this result: a score from 0 to 10, bad ones out of the lot, flaws from 0. */
export function fitsScale(value: number, result: Pick<FinishedResult, 'kind' | 'lotSize'>): boolean {
  if (result.kind === 'measured') return true;
  const most = { scored: scoreRange.most, rejects: result.lotSize, flaws: null }[result.kind];
  return value >= 0 && value <= (most ?? Number.POSITIVE_INFINITY);
}

export const resultFinished = z
  .strictObject(resultFinishedFields)
  .superRefine((result, context) => checkResult(result, context));

export const measuringFinished = z
  .strictObject({
    who: z.enum(['operator', 'other']).default('operator'),
    whoName: line,
    when: z.enum(measuringTimes).default('atOnce'),
    minutes: figure({ atLeast: 0, atMost: 10_080 }),
    /** Null: one. */
    partsPerRun: figure({ atLeast: 1, atMost: 100, whole: true }),
    gaugeStep: figure({ above: 0 }),
  })
  .superRefine((measuring, context) => {
    if (measuring.when === 'minutes' && measuring.minutes === null) point(context, ['minutes'], 'missing');
  });
