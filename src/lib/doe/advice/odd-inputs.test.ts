import { describe, expect, it } from 'vitest';
import { type Reading, readTrial, wobble } from '../../../../tests/builders/read-trial.ts';
import { buildBrief, buildInput } from '../../../../tests/builders/simulated-trial.ts';
import { AnalysisError } from '../analysis/analysis.ts';
import { analyze } from '../analysis/analyze.ts';
import { bestBetSchema, verdictSchema } from './verdict.ts';

describe('odd inputs', () => {
  const noise = wobble(59, 1);
  const cases: [string, Reading][] = [
    ['all equal', () => 7],
    ['one reading', (_, index) => (index === 3 ? 7 : null)],
    ['two readings', (_, index) => (index < 2 ? 7 + index : null)],
    ['two equal middles only', (_, index) => (index > 9 ? 7 : null)],
    ['tiny', (x) => 1e-12 * (3 + (x[0] ?? 0) + noise())],
    ['huge', (x) => 1e12 * (3 + (x[0] ?? 0) + noise())],
    ['a big offset', (x) => 1e9 + (x[0] ?? 0) + noise()],
    ['no spread but one effect', (x) => 5 + (x[0] ?? 0)],
  ];

  it.each(cases)('%s: a sensible answer without NaN in any fact', (_, reading) => {
    const { verdict, bet, results } = readTrial(reading);
    const isFiniteThroughout = (value: unknown): boolean =>
      typeof value === 'number'
        ? Number.isFinite(value)
        : value === null || typeof value !== 'object' || Object.values(value).every(isFiniteThroughout);
    expect(isFiniteThroughout(verdict)).toBe(true);
    expect(isFiniteThroughout(bet)).toBe(true);
    expect(isFiniteThroughout(results[0]?.analysis)).toBe(true);
    verdictSchema.parse(verdict);
    bestBetSchema.parse(bet);
  });

  it('says by a typed error that there is no reading at all', () => {
    expect(() => readTrial(() => null)).toThrow(AnalysisError);
    expect(() => analyze(buildInput(buildBrief(1), [{ x: [1], y: Number.NaN }]))).toThrow(AnalysisError);
    expect(() => analyze(buildInput(buildBrief(1), [{ x: [1], y: 0 }], { scale: 'log' }))).toThrow(
      AnalysisError,
    );
    expect(() => analyze(buildInput(buildBrief(2), [{ x: [1], y: 0 }]))).toThrow(RangeError);
  });
});
