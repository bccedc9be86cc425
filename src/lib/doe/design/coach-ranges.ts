import type { Fact } from '../facts.ts';
import { middleOnDial } from './dial.ts';
import { type DraftFactor, readNumber, readPositive } from './draft.ts';
import { letterAt } from './words.ts';

/** Low, middle and high are two steps apart at least; with half a step of play at each end, only twice that keeps them well apart. */
const fewestSteps = 4;
const dust = 1e-9;

/** What is odd about the range of one number setting. */
export function coachRange(factor: DraftFactor, index: number): Fact[] {
  if (factor.kind === 'choice') return [];
  const refs = { factors: [letterAt(index)] };
  const [low, high, usual] = [readNumber(factor.low), readNumber(factor.high), readNumber(factor.usual)];
  const facts = listLimits(factor, low, high).map(
    (values): Fact => ({ kind: 'end-beyond-machine', values, refs }),
  );
  if (low === undefined || high === undefined) return facts;
  if (low >= high) return [...facts, { kind: 'low-not-below-high', values: { low, high }, refs }];
  const step = readPositive(factor.step);
  if (step !== undefined && high - low < fewestSteps * step * (1 - dust))
    facts.push({
      kind: 'range-close-to-step',
      values: { low, high, step, leastWidth: fewestSteps * step },
      refs,
    });
  if (usual === undefined) return facts;
  if (usual < low || usual > high)
    return [...facts, { kind: 'usual-outside-range', values: { usual, low, high }, refs }];
  const middle = middleOnDial({ low, high, ...(step === undefined ? {} : { step }) });
  if (Math.abs(usual - middle) > dust * (high - low))
    facts.push({ kind: 'usual-not-halfway', values: { usual, middle }, refs });
  return facts;
}

interface Limit {
  end: 'low' | 'high';
  value: number;
  limit: number;
}

function listLimits(factor: DraftFactor, low: number | undefined, high: number | undefined): Limit[] {
  const [min, max] = [readNumber(factor.min), readNumber(factor.max)];
  const ends = [
    { end: 'low' as const, value: low },
    { end: 'high' as const, value: high },
  ];
  return ends.flatMap(({ end, value }): Limit[] => {
    if (value === undefined) return [];
    if (min !== undefined && value < min) return [{ end, value, limit: min }];
    if (max !== undefined && value > max) return [{ end, value, limit: max }];
    return [];
  });
}
