import type { ResponseSpec } from '../../../lib/doe/index.ts';
import type { SpokenLimits, SpokenResult } from './result-scale.ts';

/** People score in whole points unless they say otherwise. */
const scoreStep = 1;

/** Leaves out what was not said. */
export function present<Fields extends Record<string, unknown>>(
  fields: Fields,
): { [Key in keyof Fields]?: Exclude<Fields[Key], null | undefined> } {
  return Object.fromEntries(
    Object.entries(fields).filter(([, value]) => value !== null && value !== undefined),
  ) as { [Key in keyof Fields]?: Exclude<Fields[Key], null | undefined> };
}

/** A figure as it was said: bad ones out of the lot are a share to the core. */
export function toCoreFigure(figure: number, result: Pick<SpokenResult, 'kind' | 'lotSize'>): number {
  return result.kind === 'rejects' && result.lotSize !== null ? figure / result.lotSize : figure;
}

/** A result as the core reads it. Scores are measured numbers from 0 to 10 to it. */
export function toResponse(
  result: SpokenResult,
  about: {
    limits: SpokenLimits;
    usual: number | null;
    worth?: number;
    partsPerRun?: number | null;
    gaugeStep?: number | null;
  },
): ResponseSpec {
  const { limits, usual, worth, partsPerRun, gaugeStep } = about;
  const isCounted = result.kind === 'rejects' || result.kind === 'flaws';
  const toCore = (figure: number | null | undefined) =>
    figure === null || figure === undefined ? null : toCoreFigure(figure, result);
  const lower = limits.noLimit ? null : toCore(limits.atLeast);
  const upper = limits.noLimit ? null : toCore(limits.atMost);
  return {
    name: result.name,
    unit: result.unit,
    kind: result.kind === 'scored' ? 'measured' : result.kind,
    goal: result.wish,
    ...present({
      lotSize: isCounted ? result.lotSize : null,
      partsPerRun: isCounted ? null : partsPerRun,
      resolution: result.kind === 'scored' ? (gaugeStep ?? scoreStep) : isCounted ? null : gaugeStep,
      target: result.wish === 'target' ? toCore(result.target) : null,
      lower,
      upper,
      limitFor: lower === null && upper === null ? null : limits.limitFor,
      usualRate: toCore(usual),
      worthHaving: toCore(worth),
    }),
  };
}
