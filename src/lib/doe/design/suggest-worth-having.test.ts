import { describe, expect, it } from 'vitest';
import { suggestWorthHaving } from './suggest-worth-having.ts';

describe('suggestWorthHaving', () => {
  it.each([
    [2, [2, 3, 5]],
    [0.2, [0.2, 0.3, 0.5]],
    [9.7, [10, 15, 25]],
    [130, [150, 200, 300]],
  ])('rounds what fits ups and downs of %s', (sd, sizes) => {
    expect(suggestWorthHaving(sd)).toEqual(sizes);
  });

  it('names three different sizes, rising, whatever the unit', () => {
    for (let exponent = -6; exponent <= 6; exponent += 0.01) {
      const [hard, usual, easy] = suggestWorthHaving(10 ** exponent);
      expect(hard).toBeLessThan(usual);
      expect(usual).toBeLessThan(easy);
    }
  });

  it.each([0, -1, Number.NaN, Number.POSITIVE_INFINITY])('refuses %s', (sd) => {
    expect(() => suggestWorthHaving(sd)).toThrow(RangeError);
  });
});
