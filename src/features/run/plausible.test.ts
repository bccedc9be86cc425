import { expect, it } from 'vitest';
import { guessRange, isFarOff, widenRange } from './plausible.ts';

it('takes today and a gain worth having for nothing odd, a slipped point for odd', () => {
  const range = guessRange([31, 35, 39], 3);
  for (const value of [36.1, 41.5, 28, 55]) expect(isFarOff(value, range), String(value)).toBe(false);
  for (const value of [4.15, 415, 0, -41]) expect(isFarOff(value, range), String(value)).toBe(true);
});

it('knows nothing before anything was seen, and learns from the readings', () => {
  expect(guessRange([], 3)).toBeNull();
  expect(guessRange([35], 0)).toBeNull();
  expect(widenRange(null, [41, 42])).toBeNull();
  const learnt = widenRange(null, [41, 42, 40]);
  expect(isFarOff(45, learnt)).toBe(false);
  expect(isFarOff(4.1, learnt)).toBe(true);
});

it('gets wider by readings, never narrower', () => {
  const range = { low: 20, high: 60 };
  expect(widenRange(range, [41, 42, 40])).toEqual(range);
  expect(isFarOff(80, widenRange(range, [70, 75, 72]))).toBe(false);
});
