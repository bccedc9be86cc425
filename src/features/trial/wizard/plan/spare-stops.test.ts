import { describe, expect, it } from 'vitest';
import { hourStops, limitOf, moneyStops, placeOf } from './spare-stops.ts';

describe('the sliders', () => {
  it.each([
    [0.4, 0.5, 50],
    [9, 50, 5_000],
    [12_000, 50_000, 5_000_000],
  ])('stop at round amounts around what runs at %d cost', (costPerRun, first, last) => {
    const stops = moneyStops(costPerRun);
    expect([stops[0], stops.at(-1)]).toEqual([first, last]);
    expect(stops.every((stop) => String(stop).replace(/[.0]/g, '').length <= 2)).toBe(true);
  });

  it('stand at the first stop that covers what was typed, and at the end where there is no limit', () => {
    expect(placeOf(4, hourStops)).toBe(3);
    expect(placeOf(9.5, hourStops)).toBe(8);
    expect(placeOf(100, hourStops)).toBe(hourStops.length);
    expect(placeOf(null, hourStops)).toBe(hourStops.length);
  });

  it('read a limit as it was typed', () => {
    expect(limitOf('4,5', false)).toBe(4.5);
    expect(limitOf('4', true)).toBeNull();
    expect(limitOf('', undefined)).toBeNull();
  });
});
