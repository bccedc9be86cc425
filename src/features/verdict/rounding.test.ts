import { describe, expect, it } from 'vitest';
import { roundingStep, roundTo, stepThatShows } from './rounding.ts';

describe('roundingStep', () => {
  it.each([
    [41.234, 2, 'rough', 1],
    [41.234, 0.5, 'rough', 0.1],
    [41.234, 2, 'fine', 0.1],
    [1234, 80, 'fine', 10],
    [0.000001, null, 'fine', 1e-7],
    [0, null, 'fine', 1],
    [5, 0, 'rough', 0.1],
  ] as const)('of %d give or take %s, %s, is %d', (value, halfWidth, manner, step) => {
    expect(roundingStep(value, halfWidth, manner)).toBeCloseTo(step, 12);
  });
});

it('roundTo writes no decimals that are not there, and no negative zero', () => {
  expect(roundTo(0.30000000000000004, 0.1)).toEqual({ value: 0.3, digits: 1 });
  expect(roundTo(1234, 100)).toEqual({ value: 1200, digits: 0 });
  expect(Object.is(roundTo(-0.01, 0.1).value, 0)).toBe(true);
});

it('stepThatShows lets no end of an interval read as zero that is not', () => {
  expect(stepThatShows([5.6, 0.02], 0.1)).toBeCloseTo(0.01);
  expect(stepThatShows([5.6, 0], 0.1)).toBe(0.1);
});
