import { describe, expect, it } from 'vitest';
import { createColumnSpace } from './column-space.ts';

describe('createColumnSpace', () => {
  it('counts independent columns and refuses dependent ones', () => {
    const space = createColumnSpace([[1, 1, 1, 1]]);
    expect(space.add([1, -1, 1, -1])).toBe(true);
    expect(space.add([3, 1, 3, 1])).toBe(false);
    expect(space.add([0, 0, 0, 0])).toBe(false);
    expect(space.rank).toBe(2);
    expect(space.spans([5, -7, 5, -7])).toBe(true);
    expect(space.spans([1, 1, -1, -1])).toBe(false);
  });

  it('decides relative to the size of each column', () => {
    const space = createColumnSpace([[1e-12, 1e-12, 1e-12]]);
    expect(space.add([1e12, 1e12, 1e12 + 1])).toBe(false);
    expect(space.add([1e-12, 2e-12, 3e-12])).toBe(true);
  });

  it('never has more columns than rows', () => {
    const space = createColumnSpace([
      [1, 0],
      [1, 1],
    ]);
    expect(space.add([2, 5])).toBe(false);
  });
});
