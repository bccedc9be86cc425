import { describe, expect, it } from 'vitest';
import { findSettingDomain, placeOnTrack } from './track-scale.ts';

describe('placeOnTrack', () => {
  it.each([
    [120, 14],
    [160, 50],
    [200, 86],
    [90, 14],
    [500, 86],
  ])('puts %d of 120 to 200 at %d percent', (value, percent) => {
    expect(placeOnTrack(value, { from: 120, to: 200 })).toBe(percent);
  });

  it('keeps the margin it is given', () => {
    expect(placeOnTrack(-1, { from: -1, to: 1 }, 0.02)).toBe(2);
    expect(placeOnTrack(0, { from: -1, to: 1 }, 0.02)).toBe(50);
  });

  it.each([
    [1, 1],
    [2, 1],
    [0, Number.POSITIVE_INFINITY],
    [Number.NaN, 1],
  ])('refuses the domain %d to %d', (from, to) => {
    expect(() => placeOnTrack(0, { from, to })).toThrow(RangeError);
  });
});

describe('findSettingDomain', () => {
  it('ends at the machine limits where they are known', () => {
    expect(findSettingDomain({ low: 140, high: 160, min: 120, max: 200 })).toEqual({ from: 120, to: 200 });
  });

  it('leaves half a window on a side whose limit is unknown', () => {
    expect(findSettingDomain({ low: 140, high: 160, min: 120 })).toEqual({ from: 120, to: 170 });
  });

  it('reaches every value that is shown', () => {
    expect(findSettingDomain({ low: 140, high: 160, min: 145, max: 150, now: 100, next: 210 })).toEqual({
      from: 100,
      to: 210,
    });
  });

  it.each([
    [5, 5],
    [0, 0],
    [-3, -3],
  ])('is never empty, not even for %d to %d', (low, high) => {
    const { from, to } = findSettingDomain({ low, high });
    expect(to).toBeGreaterThan(from);
  });
});
